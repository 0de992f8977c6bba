import { type Database } from '#db/open-database';
import { type Planned } from './drawn-lots';
import { buildPart, buildSupplier } from '../support/builders';

export const PAST_LOTS = 10_000;
const UNITS = 10;
/** Ten typed characteristics of ten units of each lot. */
export const PAST_READINGS = PAST_LOTS * UNITS * 10;
const PARTS = 40;
const SUPPLIERS = 6;

const counting = (most: number) =>
  `with recursive counted(i) as (select 1 union all select i + 1 from counted where i < ${most})`;

/** A random UUID as the benches make them. */
const UUID = `lower(hex(randomblob(4)) || '-' || hex(randomblob(2)) || '-4' || substr(hex(randomblob(2)), 2) || '-8' ||
  substr(hex(randomblob(2)), 2) || '-' || hex(randomblob(6)))`;
const DIGEST = `lower(hex(randomblob(32)))`;
const DECIDED = `strftime('%Y-%m-%dT%H:%M:%fZ', '2024-01-01', '+' || (i / 14) || ' days', '+9 hours')`;

/** Parts and suppliers 2 and above; the first of each are there. */
function addPartsAndSuppliers(db: Database): void {
  for (let n = 2; n <= PARTS; n += 1) buildPart(db, { number: `HC-${1000 + n}` });
  for (let n = 2; n <= SUPPLIERS; n += 1) buildSupplier(db, { code: `S${n}`, name: `Supplier ${n}` });
}

function lotsSql({ revisionId }: Planned, personId: number): string {
  return `${counting(PAST_LOTS)}
    insert into lots (number, status, part_id, supplier_id, delivery_number, order_number, counted_quantity,
      stated_quantity, date_code, cartons, place, note, arrived_at, booked_by_id, revision_id, severity, sample_size, seed,
      drawn_at, units_judged, verdict, decided_at)
    select 'Y-' || i, 'released', 1 + i % ${PARTS}, 1 + i % ${SUPPLIERS}, 'D-' || i, '', 400, 400, '', 4, '', '', ${DECIDED},
      ${personId}, ${revisionId}, 'normal', ${UNITS}, i, ${DECIDED}, ${UNITS}, 'accepted', ${DECIDED}
    from counted`;
}

const UNITS_SQL = `${counting(UNITS)}
  insert into sample_units (lot_id, unit, position, carton) select lots.id, i, 7 * i, 1 from lots, counted`;

function readingsSql({ instrumentId, revisionId }: Planned, personId: number): string {
  return `insert into readings (id, lot_id, unit_id, characteristic_id, attempt, value, pass, entry, instrument_id, note,
      taken_by_id, taken_at, received_at)
    select ${UUID}, lot.id, unit.id, plan.id, 1,
      case when plan.content ->> 'kind' = 'measured' then 12.013 end,
      case when plan.content ->> 'kind' = 'attribute' then 1 end,
      '{"kind":"direct","text":"12.013","decimalComma":false}', ${instrumentId}, '', ${personId}, lot.decided_at,
      lot.decided_at
    from lots lot
    join sample_units unit on unit.lot_id = lot.id
    join plan_characteristics plan on plan.revision_id = ${revisionId} and plan.content ->> 'kind' <> 'computed'`;
}

function auditSql(personId: number): string {
  return `insert into audit_entries (at, person_id, actor, action, subject, subject_id, after, previous_hash, hash)
    select received_at, ${personId}, 'Ines Benchley', 'kept', 'reading', id,
      json_object('attempt', 1, 'characteristic', 'c1', 'lot', lot_id, 'pass', null, 'unit', 1, 'value', value),
      ${DIGEST}, ${DIGEST}
    from readings`;
}

const SUMMARIES_SQL = `insert into lot_summaries
  select id, substr(decided_at, 1, 7), decided_at, supplier_id, part_id,
    case when id % 12 = 0 then 'rejected' else 'accepted' end,
    counted_quantity, units_judged, units_judged - (id % 12 = 0), 0, id % 12 = 0, 0, counted_quantity
  from lots`;

/** Indexes are built once the rows are there: much faster than row by row. */
function withoutIndexes(db: Database, fill: () => void): void {
  const wanted = `from sqlite_master where type = 'index' and sql is not null and tbl_name in ('readings', 'audit_entries')`;
  const indexes = db.$client.prepare<[], { name: string; sql: string }>(`select name, sql ${wanted}`).all();
  for (const { name } of indexes) db.$client.exec(`drop index ${name}`);
  fill();
  for (const { sql } of indexes) db.$client.exec(sql);
}

/** Two years of lots, a million readings with their audit entries, straight in SQL. Call it on a file without lots. */
export function addYears(db: Database, references: Planned, personId: number): void {
  const { $client: client } = db;
  addPartsAndSuppliers(db);
  client.exec('pragma synchronous = OFF; pragma foreign_keys = OFF; pragma cache_size = -400000');
  withoutIndexes(db, () => {
    const statements = [
      lotsSql(references, personId),
      UNITS_SQL,
      readingsSql(references, personId),
      auditSql(personId),
      SUMMARIES_SQL,
    ];
    for (const statement of statements) client.exec(statement);
  });
  client.pragma('wal_checkpoint(TRUNCATE)');
  client.exec('pragma synchronous = FULL; pragma foreign_keys = ON; pragma cache_size = -16000');
}
