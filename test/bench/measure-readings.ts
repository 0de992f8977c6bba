import path from 'node:path';
import { median, quantile, spread } from './quantile';
import { CLIENTS, readingFile } from './reading-file';
import { loadedServer, type LoadedServer } from './reading-load';
import { type Line } from './report';
import { PAST_READINGS } from './years-of-readings';

const ROUNDS = 9;
/** Rounds at the beginning that do not count: the servers get warm. */
const WARM_UP = 2;
const ROUND = 1200;
const RATE = 200;

interface Servers {
  program: LoadedServer;
  afterYears: LoadedServer;
  bare: LoadedServer;
}
type Rates = Record<keyof Servers, number>;

/** One after the other in every round, so that what else the machine does falls on all of them alike. */
async function rates({ program, afterYears, bare }: Servers): Promise<Rates[]> {
  const rounds: Rates[] = [];
  for (let round = 0; round < ROUNDS; round += 1)
    rounds.push({
      program: await program.fullSpeed(ROUND),
      bare: await bare.fullSpeed(ROUND),
      afterYears: await afterYears.fullSpeed(ROUND),
    });
  return rounds.slice(WARM_UP);
}

function ratioLine(what: string, ratios: readonly number[], perSecond: string, least: number): Line {
  const measured = `x ${spread(ratios, 2)}, ${perSecond}`;
  return { what, measured, bar: `>= ${least} x`, holds: median(ratios) >= least };
}

function rateLines(rounds: readonly Rates[]): Line[] {
  const rateOf = (server: keyof Servers) => `${median(rounds.map((round) => round[server])).toFixed(0)}/s`;
  const ratios = (over: keyof Servers, under: keyof Servers) => rounds.map((round) => round[over] / round[under]);
  return [
    ratioLine(
      `reading PUT with ${CLIENTS} clients, against a bare insert of its row`,
      ratios('program', 'bare'),
      `${rateOf('program')} against ${rateOf('bare')}`,
      0.4,
    ),
    ratioLine(
      `  with ${PAST_READINGS} readings in the file, against an empty one`,
      ratios('afterYears', 'program'),
      rateOf('afterYears'),
      0.8,
    ),
  ];
}

async function latencyLine({ program, bare }: Servers): Promise<Line> {
  const ours = await program.steady(RATE, 10_000);
  const theirs = await bare.steady(RATE, 4_000);
  const p99 = quantile(ours, 0.99);
  const beside = `median ${median(ours).toFixed(1)}, most ${Math.max(...ours).toFixed(1)}; bare p99 ${quantile(theirs, 0.99).toFixed(1)}`;
  return {
    what: `  at ${RATE} a second, from the moment each was due`,
    measured: `p99 ${p99.toFixed(1)} ms, ${beside}`,
    bar: '< 25 ms',
    holds: p99 < 25,
  };
}

/** @returns the lines, and the file that holds years of readings */
export async function measureReadings(folder: string): Promise<{ lines: Line[]; afterYears: string }> {
  const years = await readingFile(path.join(folder, 'years.db'), true);
  const servers: Servers = {
    program: await loadedServer('program', await readingFile(path.join(folder, 'empty.db'), false)),
    bare: await loadedServer('bare', await readingFile(path.join(folder, 'bare.db'), false)),
    afterYears: await loadedServer('program', years),
  };
  const lines = [...rateLines(await rates(servers)), await latencyLine(servers)];
  for (const server of Object.values(servers)) server.stop();
  return { lines, afterYears: years.file };
}
