import { type Db } from '#db/open-database';
import { site } from '#db/schema/site';
import { type Site } from '#shared/contract/site';

/** What a site starts with; eight hours from the dock to the bench is a working day. Common practice, no source. */
const FRESH: Site = {
  name: 'New site',
  department: 'Incoming inspection',
  address: '',
  engineeringList: [],
  waitingTargetHours: 8,
  approveOwnPlans: false,
  releaseOwnReadings: false,
  dailyChecks: false,
  version: 1,
};

/** The settings of the site; those of a fresh one until an administrator has kept some. */
export function findSite(db: Db): Site {
  return db.select().from(site).get() ?? FRESH;
}
