import { type Db } from '#db/open-database';
import { instrumentReviews } from '#db/schema/calibrations';
import { certificates } from '#db/schema/certificates';
import { gaugeStudies } from '#db/schema/gauge-studies';
import { instruments } from '#db/schema/instruments';
import { lots } from '#db/schema/lots';
import { nonconformances } from '#db/schema/nonconformances';
import { parts } from '#db/schema/parts';
import { people } from '#db/schema/people';
import { racks } from '#db/schema/racks';
import { suppliers } from '#db/schema/suppliers';
import { eq } from 'drizzle-orm';

/** Where the name of a subject stands, for those the trail knows by an id. Numbers and names are unique. */
const NAMES = {
  lot: { table: lots, name: lots.number },
  certificate: { table: certificates, name: certificates.number },
  nonconformance: { table: nonconformances, name: nonconformances.number },
  part: { table: parts, name: parts.number },
  supplier: { table: suppliers, name: suppliers.code },
  instrument: { table: instruments, name: instruments.assetNumber },
  'gauge-study': { table: gaugeStudies, name: gaugeStudies.number },
  review: { table: instrumentReviews, name: instrumentReviews.number },
  person: { table: people, name: people.email },
  rack: { table: racks, name: racks.name },
  'reading-batch': { table: lots, name: lots.number },
} as const;

function isNamed(subject: string): subject is keyof typeof NAMES {
  return Object.hasOwn(NAMES, subject);
}

/** What people call a subject of the trail: a lot's number for its id; the id itself where it is a name already. */
export function subjectName(db: Db, subject: string, subjectId: string): string {
  if (!isNamed(subject)) return subjectId;
  const { table, name } = NAMES[subject];
  return (
    db
      .select({ name })
      .from(table)
      .where(eq(table.id, Number(subjectId)))
      .get()?.name ?? subjectId
  );
}

/** The ids in the trail that a text names: itself, and the id of the record with that number. */
export function subjectIds(db: Db, subject: string | undefined, text: string): string[] {
  const kinds = Object.entries(NAMES).filter(([kind]) => subject === undefined || subject === kind);
  const found = kinds.flatMap(([, { table, name }]) =>
    db.select({ id: table.id }).from(table).where(eq(name, text)).all(),
  );
  return [text, ...found.map(({ id }) => String(id))];
}
