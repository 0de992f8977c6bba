import { type Db } from '#db/open-database';
import { certificates } from '#db/schema/certificates';
import { lots } from '#db/schema/lots';
import { nonconformances } from '#db/schema/nonconformances';
import { parts } from '#db/schema/parts';
import { suppliers } from '#db/schema/suppliers';
import { type Caller, mayCall } from '#server/caller';
import { visibleTo } from '#server/nonconformances/nonconformance-queries';
import { listCertificates } from '#shared/contract/certificates';
import { type Hit } from '#shared/contract/counts';
import { listLots, LOT_STATUS_TITLES } from '#shared/contract/lots';
import { listNonconformances } from '#shared/contract/nonconformances';
import { listParts } from '#shared/contract/parts';
import { listSuppliers } from '#shared/contract/suppliers';
import { and, desc, eq } from 'drizzle-orm';
import { matches, prefixesFirst } from './match';

const MOST_HITS = 12;

function findLots(db: Db, text: string): Hit[] {
  const rows = db
    .select({ id: lots.id, title: lots.number, status: lots.status, part: parts.number, supplier: suppliers.name })
    .from(lots)
    .innerJoin(parts, eq(parts.id, lots.partId))
    .innerJoin(suppliers, eq(suppliers.id, lots.supplierId))
    .where(matches(text, lots.number, lots.deliveryNumber, lots.orderNumber))
    .orderBy(prefixesFirst(text, lots.number), desc(lots.id))
    .limit(MOST_HITS)
    .all();
  return rows.map(({ id, title, status, part, supplier }) => {
    return { kind: 'lot', id, title, note: `${part}, ${supplier}, ${LOT_STATUS_TITLES[status].toLowerCase()}` };
  });
}

function findParts(db: Db, text: string): Hit[] {
  const rows = db
    .select({ id: parts.id, title: parts.number, note: parts.name })
    .from(parts)
    .where(matches(text, parts.number, parts.name))
    .orderBy(prefixesFirst(text, parts.number), parts.number)
    .limit(MOST_HITS)
    .all();
  return rows.map((row) => ({ kind: 'part', ...row }));
}

function findSuppliers(db: Db, text: string): Hit[] {
  const rows = db
    .select({ id: suppliers.id, title: suppliers.name, note: suppliers.code })
    .from(suppliers)
    .where(matches(text, suppliers.name, suppliers.code))
    .orderBy(prefixesFirst(text, suppliers.name), suppliers.name)
    .limit(MOST_HITS)
    .all();
  return rows.map((row) => ({ kind: 'supplier', ...row }));
}

function findCertificates(db: Db, text: string): Hit[] {
  const rows = db
    .select({ id: certificates.id, title: certificates.number, lot: lots.number })
    .from(certificates)
    .innerJoin(lots, eq(lots.id, certificates.lotId))
    .where(matches(text, certificates.number))
    .orderBy(prefixesFirst(text, certificates.number), desc(certificates.id))
    .limit(MOST_HITS)
    .all();
  return rows.map(({ id, title, lot }) => ({ kind: 'certificate', id, title, note: `Lot ${lot}` }));
}

function findNonconformances(db: Db, caller: Caller, text: string): Hit[] {
  const rows = db
    .select({ id: nonconformances.id, title: nonconformances.number, lot: lots.number })
    .from(nonconformances)
    .innerJoin(lots, eq(lots.id, nonconformances.lotId))
    .where(and(matches(text, nonconformances.number), visibleTo(caller)))
    .orderBy(prefixesFirst(text, nonconformances.number), desc(nonconformances.id))
    .limit(MOST_HITS)
    .all();
  return rows.map(({ id, title, lot }) => ({ kind: 'nonconformance', id, title, note: `Lot ${lot}` }));
}

/** Whatever the caller may read that has the text in its number or name; what begins with it comes first. */
export function findHits(db: Db, caller: Caller, text: string): Hit[] {
  const hits = [
    ...(mayCall(caller, listLots) ? findLots(db, text) : []),
    ...(mayCall(caller, listParts) ? findParts(db, text) : []),
    ...(mayCall(caller, listSuppliers) ? findSuppliers(db, text) : []),
    ...(mayCall(caller, listCertificates) ? findCertificates(db, text) : []),
    ...(mayCall(caller, listNonconformances) ? findNonconformances(db, caller, text) : []),
  ];
  const begins = ({ title }: Hit) => title.toLowerCase().startsWith(text.toLowerCase());
  return [...hits.filter(begins), ...hits.filter((hit) => !begins(hit))].slice(0, MOST_HITS);
}
