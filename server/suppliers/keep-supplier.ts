import { type Db } from '#db/open-database';
import { suppliers } from '#db/schema/suppliers';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { holdVersion, NotFound } from '#server/problems';
import { holdUnique } from '#server/taken';
import { type Supplier, type supplierBody } from '#shared/contract/suppliers';
import { eq } from 'drizzle-orm';
import type * as z from 'zod';
import { findSupplier } from './supplier-queries';

type Body = z.output<typeof supplierBody>;

function holdOwnNames(db: Db, own: number | undefined, { code, name }: Body): void {
  holdUnique(db, suppliers, own, [
    { column: suppliers.code, value: code, path: ['code'], message: 'This code is taken.' },
    { column: suppliers.name, value: name, path: ['name'], message: 'This name is taken.' },
  ]);
}

export function addSupplier({ db, clock }: Context, caller: Caller, body: Body): Supplier {
  return db.transaction((tx) => {
    holdOwnNames(tx, undefined, body);
    const { id } = tx.insert(suppliers).values(body).returning({ id: suppliers.id }).get();
    record(tx, { at: clock.now(), person: caller, action: 'added', subject: 'supplier', subjectId: id, after: body });
    return findSupplier(tx, id);
  });
}

export function changeSupplier(
  { db, clock }: Context,
  caller: Caller,
  { id, version, body }: { id: number; version: number; body: Body },
): Supplier {
  return db.transaction((tx) => {
    const row = tx.select().from(suppliers).where(eq(suppliers.id, id)).get();
    if (!row) throw new NotFound('This supplier');
    const { version: current, ...before } = row;
    holdVersion('The supplier', current, version);
    holdOwnNames(tx, id, body);
    tx.update(suppliers)
      .set({ ...body, version: current + 1 })
      .where(eq(suppliers.id, id))
      .run();
    const change = { action: 'changed', subject: 'supplier', subjectId: id, before, after: body };
    record(tx, { at: clock.now(), person: caller, ...change });
    return findSupplier(tx, id);
  });
}
