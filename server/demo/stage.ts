import { DEMO_SITE, DEMO_SUPPLIERS } from '#db/demo/companies';
import { type DemoCalibration, demoCalibrations } from '#db/demo/demo-calibrations';
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
  /** Due date of the last of its calibrations. */
  calibrationDue: string;
  /** The last day it was used; null while it is. */
  usedUntil: string | null;
  /** Oldest first. */
  calibrations: readonly DemoCalibration[];
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
  const dayIn = (days: number) => dayOf(new Date(until.getTime() + days * DAY));
  const beginsInDays = Math.ceil((context.clock.now().getTime() - until.getTime()) / DAY);
  return DEMO_INSTRUMENTS.map((demo) => {
    const { dueInDays, everyDays, isOutAtLast, ranges, ...instrument } = demo;
    const calibrations = demoCalibrations(demo, beginsInDays);
    const calibrationDue = dayIn(calibrations[0]?.dueInDays ?? dueInDays);
    const body = { ...instrument, ranges: [...ranges], calibrationDue, status: 'in-service' as const };
    const { id, assetNumber, kind } = addInstrument(context, cast.quality[0], body);
    const usedUntil = isOutAtLast ? dayIn(dueInDays - everyDays - 1) : null;
    return { id, assetNumber, kind, calibrationDue: dayIn(dueInDays), usedUntil, calibrations };
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
