import { type Characteristic, type Plan, type RevisionBody } from '#shared/contract/plans';
import { expect, type APIRequestContext } from '@playwright/test';

let parts = 0;

async function made<T>(
  answer: Promise<{ status(): number; text(): Promise<string>; json(): Promise<unknown> }>,
  status: number,
): Promise<T> {
  const got = await answer;
  expect(got.status(), await got.text()).toBe(status);
  return (await got.json()) as T;
}

/** A part with an effective plan of this content, written by one quality engineer and approved by another. */
export async function plannedPart(
  author: APIRequestContext,
  approver: APIRequestContext,
  content: Omit<RevisionBody, 'changeNote'>,
): Promise<{ id: number; number: string }> {
  parts += 1;
  const number = `WA-12-J${process.pid}-${parts}`;
  const model = {
    topology: 'centre-tap',
    lineVolts: 230,
    lineHertz: 50,
    ratedVolts: 12,
    ratedAmperes: 0.5,
    secondaryPeakVolts: 15.6,
    sourceOhms: 1.1,
    diodeDropVolts: 0.8,
    filterFarads: 0.0022,
    filterTolerance: 0.2,
    filterEsrOhms: null,
  };
  const part = await made<{ id: number }>(
    author.post('/api/parts', {
      data: { number, name: 'Wall adapter 12 V, 500 mA', form: 'wall-adapter', model, active: true },
    }),
    201,
  );
  const plan = await made<Plan>(
    author.post('/api/plans', { data: { partId: part.id, content: { ...content, changeNote: 'First issue' } } }),
    201,
  );
  const step = async (who: APIRequestContext, name: string, version: number) => {
    const path = `/api/plans/${plan.id}/revisions/1/${name}`;
    return made<Plan>(who.post(path, { headers: { 'if-match': `"${version}"` } }), 200);
  };
  const inReview = await step(author, 'submission', plan.revisions[0]?.version ?? 0);
  await step(approver, 'approval', inReview.revisions[0]?.version ?? 0);
  return { id: part.id, number };
}

const common = { condition: 'at 500 mA', method: '', ownLevel: null, ownAql: null } as const;
const CAUTION = 'Isolated supply only, cover on.';

/** The characteristics of the journeys' adapter: looked at, metered, read from a scope, computed. */
export const ADAPTER: readonly Characteristic[] = [
  {
    ...common,
    kind: 'attribute',
    key: 'polarity',
    name: 'Polarity',
    class: 'critical',
    caution: '',
    requirement: 'Centre positive',
    failReasons: ['Reversed'],
    instrumentKind: null,
  },
  {
    ...common,
    kind: 'measured',
    key: 'v_no_load',
    measurand: 'no-load-voltage',
    name: 'No-load voltage',
    class: 'major',
    caution: CAUTION,
    unit: 'V',
    decimals: 2,
    target: null,
    lowerLimit: 14,
    upperLimit: 16,
    entryMode: 'direct',
    alternatePeaks: 'worst',
    instrumentKind: 'multimeter',
  },
  {
    ...common,
    kind: 'measured',
    key: 'v_loaded',
    measurand: 'loaded-voltage',
    name: 'Loaded voltage',
    class: 'major',
    caution: CAUTION,
    unit: 'V',
    decimals: 2,
    target: 12,
    lowerLimit: 11.4,
    upperLimit: 12.9,
    entryMode: 'direct',
    alternatePeaks: 'worst',
    instrumentKind: 'multimeter',
  },
  {
    ...common,
    kind: 'measured',
    key: 'ripple_pp',
    measurand: 'ripple',
    name: 'Ripple',
    class: 'major',
    caution: CAUTION,
    unit: 'V p-p',
    decimals: 2,
    target: null,
    lowerLimit: null,
    upperLimit: 2.4,
    entryMode: 'scope',
    alternatePeaks: 'worst',
    instrumentKind: 'oscilloscope',
  },
  {
    ...common,
    kind: 'computed',
    key: 'regulation',
    name: 'Load regulation',
    class: 'minor',
    caution: '',
    unit: '%',
    decimals: 1,
    target: null,
    lowerLimit: null,
    upperLimit: 0.3,
    formula: { key: 'load-regulation', inputs: { no_load: 'v_no_load', loaded: 'v_loaded' }, constants: {} },
  },
];

export const ADAPTER_PLAN: Omit<RevisionBody, 'changeNote'> = {
  level: 'II',
  classAqls: [
    { class: 'critical', aql: '0.15' },
    { class: 'major', aql: '1.0' },
    { class: 'minor', aql: '2.5' },
  ],
  characteristics: [...ADAPTER],
  decisionRule: 'simple',
  coverageFactor: 2,
  warmUpMinutes: null,
};
