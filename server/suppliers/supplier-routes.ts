import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/suppliers';
import { type Router } from 'express';
import { addSupplier, changeSupplier } from './keep-supplier';
import { findSupplier, listSuppliers } from './supplier-queries';

export function supplierRoutes(router: Router, context: Context): void {
  const { db } = context;
  serve(router, contract.listSuppliers, () => ({ items: listSuppliers(db) }));
  serve(router, contract.readSupplier, ({ params }) => findSupplier(db, params.id));
  serve(router, contract.addSupplier, ({ caller, body }) => addSupplier(context, caller, body));
  serve(router, contract.changeSupplier, ({ caller, params, version, body }) =>
    changeSupplier(context, caller, { id: params.id, version, body }),
  );
}
