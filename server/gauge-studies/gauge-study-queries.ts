import { type Db } from '#db/open-database';
import { gaugeStudies } from '#db/schema/gauge-studies';
import { instruments } from '#db/schema/instruments';
import { people } from '#db/schema/people';
import { pageAfter, type Page, type PageQuery } from '#server/page-after';
import { NotFound } from '#server/problems';
import { type GaugeStudy, type GaugeStudyHead } from '#shared/contract/gauge-studies';
import { desc, eq, lt } from 'drizzle-orm';
import { countsOf, gaugeOfVariation, resultsOf } from './study-view';

export type StudyRow = typeof gaugeStudies.$inferSelect;

interface JoinedRow {
  study: StudyRow;
  instrument: GaugeStudyHead['instrument'];
  author: string;
}

function joined(db: Db) {
  return db
    .select({
      study: gaugeStudies,
      instrument: {
        id: instruments.id,
        assetNumber: instruments.assetNumber,
        description: instruments.description,
      },
      author: people.name,
    })
    .from(gaugeStudies)
    .innerJoin(instruments, eq(instruments.id, gaugeStudies.instrumentId))
    .innerJoin(people, eq(people.id, gaugeStudies.createdById));
}

function headOf({ study, instrument, author }: JoinedRow, gauge: number | null): GaugeStudyHead {
  const { id, number, title, quantity, status, createdAt, closedAt } = study;
  const head = { id, number, title, instrument, quantity, status, author, createdAt, closedAt };
  return { ...head, ...countsOf(study), gaugeOfVariation: gauge };
}

/** A page of gauge studies, newest first. */
export function listGaugeStudies(db: Db, page: PageQuery): Page<GaugeStudyHead> {
  return pageAfter(page, (before, limit) =>
    joined(db)
      .where(before === undefined ? undefined : lt(gaugeStudies.id, before))
      .orderBy(desc(gaugeStudies.id))
      .limit(limit)
      .all()
      .map((row) => headOf(row, gaugeOfVariation(resultsOf(row.study)))),
  );
}

/** @throws {NotFound} */
export function findStudyRow(db: Db, id: number): StudyRow {
  const row = db.select().from(gaugeStudies).where(eq(gaugeStudies.id, id)).get();
  if (!row) throw new NotFound('This gauge study');
  return row;
}

/** @throws {NotFound} */
export function readGaugeStudy(db: Db, id: number): GaugeStudy {
  const row = joined(db).where(eq(gaugeStudies.id, id)).get();
  if (!row) throw new NotFound('This gauge study');
  const results = resultsOf(row.study);
  const { unit, decimals, lowerLimit, upperLimit, parts, persons, trials, values, note, version } = row.study;
  const entered = { unit, decimals, lowerLimit, upperLimit, parts, persons, trials, values, note, version };
  return { ...headOf(row, gaugeOfVariation(results)), ...entered, results };
}
