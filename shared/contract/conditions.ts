import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { moment, optionalLine } from './fields';

/** What a lot was measured under. SI base units; the temperature in °C, as a room thermometer shows it. */
export const lotConditions = z.object({
  ambientCelsius: z.number().min(-40, 'At least -40 °C.').max(85, 'At most 85 °C.').nullable(),
  mainsVolts: z.number().positive('Must be more than 0.').max(500, 'At most 500 V.').nullable(),
  mainsHertz: z.number().min(40, 'At least 40 Hz.').max(70, 'At most 70 Hz.').nullable(),
  /** As "electronic load, constant current". */
  load: optionalLine(80),
  /** As "20 MHz, short tip ground, 100 nF and 10 µF". */
  bandwidth: optionalLine(80),
  /** When the warm-up that the plan asks for was started. */
  warmUpStartedAt: moment.nullable(),
  note: optionalLine(200),
});
export type LotConditions = z.infer<typeof lotConditions>;

export const notedConditions = lotConditions.extend({ notedAt: moment, notedBy: z.string() });
export type NotedConditions = z.infer<typeof notedConditions>;

export const noteConditions = endpoint({
  method: 'PUT',
  path: '/api/lots/:id/conditions',
  who: ['inspector', 'quality'],
  summary: 'Note the conditions a lot is measured under; what was noted before stays on record.',
  params: byId,
  body: lotConditions,
  reply: notedConditions,
});
