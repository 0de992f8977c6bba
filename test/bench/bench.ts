import { openDatabase } from '#db/open-database';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import process from 'node:process';
import { measureCertificate } from './measure-certificate';
import { measureFirstPage } from './measure-first-page';
import { measureRackFile } from './measure-rack-file';
import { measureReadings } from './measure-readings';
import { measureVerdicts } from './measure-verdicts';
import { measureWaveform } from './measure-waveform';
import { measureYields } from './measure-yields';
import { readingFile } from './reading-file';
import { type Line, table } from './report';

async function measureAll(folder: string): Promise<Line[]> {
  const certificate = await measureCertificate();
  const verdicts = await measureVerdicts();
  const waveform = await measureWaveform();
  const { lines: readings, afterYears } = await measureReadings(folder);
  const db = openDatabase(afterYears, process.cwd());
  const yields = await measureYields(db);
  db.$client.close();
  const rack = await measureRackFile(folder);
  const page = await measureFirstPage(await readingFile(path.join(folder, 'page.db'), false));
  return [...readings, ...verdicts, ...waveform, ...yields, ...rack, ...certificate, ...page];
}

const start = performance.now();
const folder = mkdtempSync(path.join(tmpdir(), 'quietrail-bench-'));
try {
  const lines = await measureAll(folder);
  const seconds = ((performance.now() - start) / 1000).toFixed(0);
  process.stdout.write(
    `${table(lines)}\n\nMedians with the least and the largest of all turns; ${seconds} s in all.\n`,
  );
} finally {
  rmSync(folder, { recursive: true, force: true });
}
