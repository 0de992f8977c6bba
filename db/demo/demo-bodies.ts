import { type instrumentBody } from '#shared/contract/instruments';
import { type partBody } from '#shared/contract/parts';
import { type siteBody } from '#shared/contract/site';
import { type supplierBody } from '#shared/contract/suppliers';
import type * as z from 'zod';

/** What the demo hands to the acts, in the shapes of the contract. */
export type SiteBody = z.output<typeof siteBody>;
export type SupplierBody = z.output<typeof supplierBody>;
export type PartBody = z.output<typeof partBody>;
export type InstrumentBody = z.output<typeof instrumentBody>;
