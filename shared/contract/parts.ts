import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { id, line, positive, version } from './fields';
import { ROLES } from './roles';

const WRITERS = ['quality'] as const;

export const FORMS = ['wall-adapter', 'desktop-adapter', 'open-frame'] as const;
export const FORM_TITLES: Record<(typeof FORMS)[number], string> = {
  'wall-adapter': 'Wall adapter',
  'desktop-adapter': 'Desktop adapter',
  'open-frame': 'Open frame',
};

export const TOPOLOGIES = ['half-wave', 'centre-tap', 'bridge', 'linear-regulated', 'switch-mode'] as const;
export const TOPOLOGY_TITLES: Record<(typeof TOPOLOGIES)[number], string> = {
  'half-wave': 'Transformer, half-wave, capacitor',
  'centre-tap': 'Transformer, full-wave centre tap, capacitor',
  bridge: 'Transformer, bridge, capacitor',
  'linear-regulated': 'Linear regulated',
  'switch-mode': 'Switch mode',
};

/** What the part is electrically; all in SI base units, ratios as fractions. */
export const electricalModel = z
  .object({
    topology: z.enum(TOPOLOGIES),
    lineVolts: positive.max(1000),
    lineHertz: z.union([z.literal(50), z.literal(60)], { error: 'The mains has 50 or 60 Hz.' }),
    ratedVolts: positive.max(1000),
    ratedAmperes: positive.max(1000),
    /** No-load peak of the secondary, of each half at a centre tap. */
    secondaryPeakVolts: positive.max(2000).nullable(),
    sourceOhms: z.number().min(0, 'Not negative.').max(10000).nullable(),
    diodeDropVolts: z.number().min(0, 'Not negative.').max(5).nullable(),
    filterFarads: positive.max(10).nullable(),
    /** Fraction, 0.2 for +/-20 %. */
    filterTolerance: z.number().min(0, 'Not negative.').max(0.99, 'At most 99 %.').nullable(),
    filterEsrOhms: z.number().min(0, 'Not negative.').max(1000).nullable(),
  })
  .refine((model) => model.topology === 'switch-mode' || model.filterFarads !== null, {
    path: ['filterFarads'],
    message: 'A transformer supply has a filter capacitor; give its capacitance.',
  });
export type ElectricalModel = z.infer<typeof electricalModel>;

const band = z.object({ low: z.number(), high: z.number() });

/** What the part's rectifier ought to give, over its tolerance corners, in volts; ripple peak to peak. */
export const expectedBands = z.object({
  ripple: band,
  loaded: band,
  noLoad: band,
  nominal: z.object({ rippleVolts: z.number(), loadedVolts: z.number(), noLoadVolts: z.number() }),
});
export type ExpectedBands = z.infer<typeof expectedBands>;

export const partBody = z.object({
  number: z
    .string()
    .trim()
    .regex(/^[A-Z0-9][A-Z0-9.-]{1,23}$/, 'Capital letters, digits, points and hyphens, at most 24.'),
  name: line(120),
  form: z.enum(FORMS),
  model: electricalModel,
  active: z.boolean(),
});
export const part = partBody.extend({
  id,
  version,
  /** Null where the part has no rectifier model. */
  expected: expectedBands.nullable(),
  plan: z.object({ id, number: z.string(), effectiveRevision: z.int().nullable() }).nullable(),
});
export type Part = z.infer<typeof part>;

export const listParts = endpoint({
  method: 'GET',
  path: '/api/parts',
  who: ROLES,
  summary: 'All parts.',
  reply: z.object({ items: z.array(part) }),
});
export const readPart = endpoint({
  method: 'GET',
  path: '/api/parts/:id',
  who: ROLES,
  summary: 'One part.',
  params: byId,
  reply: part,
});
export const addPart = endpoint({
  method: 'POST',
  path: '/api/parts',
  who: WRITERS,
  summary: 'Add a part.',
  body: partBody,
  status: 201,
  reply: part,
});
export const changePart = endpoint({
  method: 'PUT',
  path: '/api/parts/:id',
  who: WRITERS,
  summary: 'Change a part.',
  params: byId,
  body: partBody,
  versioned: true,
  reply: part,
});
