import { site } from '#db/schema/site';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { holdVersion } from '#server/problems';
import { type Site, type siteBody } from '#shared/contract/site';
import type * as z from 'zod';
import { findSite } from './site-queries';

/** Changes the settings; a two-person rule that is waived, or no longer, stands in the audit entry's before and after. */
export function changeSite(
  { db, clock }: Context,
  caller: Caller,
  { version, body }: { version: number; body: z.output<typeof siteBody> },
): Site {
  return db.transaction((tx) => {
    const { version: current, ...before } = findSite(tx);
    holdVersion('The site', current, version);
    const kept = { ...body, version: current + 1 };
    tx.insert(site).values(kept).onConflictDoUpdate({ target: site.id, set: kept }).run();
    const change = { action: 'changed', subject: 'site', subjectId: 1, before, after: body };
    record(tx, { at: clock.now(), person: caller, ...change });
    return findSite(tx);
  });
}
