import { DEMO_SITE, DEMO_SUPPLIERS } from '#db/demo/companies';
import { DEMO_INSTRUMENTS } from '#db/demo/demo-instruments';
import { DEMO_PARTS } from '#db/demo/demo-parts';
import { DEMO_RACK } from '#db/demo/rack-file';
import { firstRevision } from '#db/demo/demo-plans';
import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { addInstrument } from '#server/instruments/keep-instrument';
import { addPart } from '#server/parts/keep-part';
import { addPlan } from '#server/plans/add-plan';
import { addRack } from '#server/racks/keep-rack';
import { changeSite } from '#server/site/change-site';
import { findSite } from '#server/site/site-queries';
import { addSupplier } from '#server/suppliers/keep-supplier';
import { type InstrumentKind } from '#shared/contract/instruments';
import { type Cast } from './cast';
import { type DemoClock } from './demo-clock';
import { approvePlan } from './approve-plan';

const DAY = 86_400_000;

export interface StagedInstrument {
  id: number;
  assetNumber: string;
  kind: InstrumentKind;
  calibrationDue: string;
}

/** Ids of what the lots of the quarter name. */
export interface Stage {
  partIds: ReadonlyMap<string, number>;
  planIds: ReadonlyMap<string, number>;
  supplierIds: ReadonlyMap<string, number>;
  instruments: readonly StagedInstrument[];
  /** The rack that reads whole samples; what its columns hold is said at the first import. */
  rackId: number;
}

function addInstruments(context: Context, cast: Cast, until: Date): StagedInstrument[] {
  return DEMO_INSTRUMENTS.map(({ dueInDays, ranges, ...instrument }) => {
    const calibrationDue = dayOf(new Date(until.getTime() + dueInDays * DAY));
    return addInstrument(context, cast.quality[0], {
      ...instrument,
      ranges: [...ranges],
      calibrationDue,
      status: 'in-service',
    });
  });
}

/** Writes the plan of each part by one quality engineer and has it approved by the other. */
function addPlans(context: Context, clock: DemoClock, cast: Cast, partIds: Stage['partIds']): Map<string, number> {
  const planIds = new Map<string, number>();
  DEMO_PARTS.forEach((part, index) => {
    const [first, second] = cast.quality;
    const [author, approver] = index % 2 === 0 ? [first, second] : [second, first];
    const partId = partIds.get(part.body.number);
    if (partId === undefined) throw new Error(`Part ${part.body.number} was not added.`);
    clock.advance(1500);
    const plan = addPlan(context, author, { partId, content: firstRevision(part) });
    clock.advance(120);
    approvePlan(context, clock, { planId: plan.id, author, approver });
    planIds.set(part.body.number, plan.id);
  });
  return planIds;
}

/** The first morning: settings, suppliers, parts, instruments and plans. */
export function setStage(context: Context, clock: DemoClock, cast: Cast, until: Date): Stage {
  const [quality] = cast.quality;
  changeSite(context, cast.admin, { version: findSite(context.db).version, body: DEMO_SITE });
  clock.advance(600);
  const suppliers = DEMO_SUPPLIERS.map((body) => addSupplier(context, quality, body));
  const parts = DEMO_PARTS.map(({ body }) => addPart(context, quality, body));
  clock.advance(600);
  const instruments = addInstruments(context, cast, until);
  const partIds = new Map(parts.map(({ id, number }) => [number, id]));
  return {
    partIds,
    planIds: addPlans(context, clock, cast, partIds),
    supplierIds: new Map(suppliers.map(({ id, code }) => [code, id])),
    instruments,
    rackId: addRack(context, cast.admin, { ...DEMO_RACK, active: true, partIds: [...partIds.values()], mapping: {} })
      .id,
  };
}
