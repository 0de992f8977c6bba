import { HIGHEST_AQL } from '#shared/plan/class-faults';
import { AQLS } from '#shared/sampling/scheme';

/** The AQLs that a plan may give: those that stand for percent nonconforming units. */
export const UNIT_AQLS = AQLS.filter((aql) => Number(aql) <= HIGHEST_AQL);
