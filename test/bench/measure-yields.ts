import { type Database } from '#db/open-database';
import { readYields } from '#server/yields/yield-queries';
import { median, spread } from './quantile';
import { type Line } from './report';
import { timeOf } from './timing';
import { PAST_LOTS, PAST_READINGS } from './years-of-readings';

const SUMS = `count(*), sum(verdict = 'accepted'), sum(verdict = 'rejected'), sum(units_judged), sum(units_conforming),
  sum(units_released)`;

/** The same four questions as somebody would write them down who needs nothing else. */
function byHand({ $client: client }: Database): () => unknown {
  const statements = [
    `select ${SUMS} from lot_summaries`,
    `select month, ${SUMS} from lot_summaries group by month`,
    `select name, code, ${SUMS} from lot_summaries join suppliers on suppliers.id = supplier_id group by supplier_id`,
    `select number, name, ${SUMS} from lot_summaries join parts on parts.id = part_id group by part_id`,
  ].map((sql) => client.prepare(sql));
  return () => statements.map((statement) => statement.all());
}

/** Yields over all lots on a file that holds years of them. */
export async function measureYields(db: Database): Promise<Line[]> {
  const ask = byHand(db);
  const ours: number[] = [];
  const theirs: number[] = [];
  for (let turn = 0; turn < 20; turn += 1) {
    ours.push(await timeOf(() => readYields(db, {})));
    theirs.push(await timeOf(ask));
  }
  const ratios = ours.map((time, turn) => time / (theirs[turn] ?? NaN));
  const among = `${PAST_LOTS} lots and ${PAST_READINGS} readings`;
  return [
    {
      what: `yields over ${among}`,
      measured: `${spread(ours, 1)} ms`,
      bar: '< 100 ms',
      holds: median(ours) < 100,
    },
    {
      what: '  against hand-written SQL',
      measured: `x ${spread(ratios, 2)}, by hand ${spread(theirs, 1)} ms`,
      bar: '<= 2 x',
      holds: median(ratios) <= 2,
    },
  ];
}
