import * as z from 'zod';
import { endpoint } from './endpoint';
import { line, mailAddress, positive, prose, version } from './fields';
import { role } from './roles';

/** What the sign-in page may know. */
export const front = z.object({
  name: z.string(),
  mode: z.enum(['demo', 'production']),
  version: z.string(),
  signIns: z.array(z.object({ name: z.string(), roles: z.array(role), email: z.string(), password: z.string() })),
});
export type Front = z.infer<typeof front>;

export const siteBody = z.object({
  name: line(80),
  department: line(80),
  address: prose(300),
  engineeringList: z.array(mailAddress).max(20),
  waitingTargetHours: positive.max(240, 'At most 240 hours.'),
  approveOwnPlans: z.boolean(),
  releaseOwnReadings: z.boolean(),
  /** Whether an instrument is checked against its reference before its first reading of a day. */
  dailyChecks: z.boolean().default(false),
});
export const site = siteBody.extend({ version });
export type Site = z.infer<typeof site>;

export const readFront = endpoint({
  method: 'GET',
  path: '/api/front',
  who: 'anyone',
  summary: 'Name and mode of the site; in demo mode its sign-ins.',
  reply: front,
});

export const readSite = endpoint({
  method: 'GET',
  path: '/api/site',
  who: ['auditor', 'admin'],
  summary: 'Site settings.',
  reply: site,
});

export const changeSite = endpoint({
  method: 'PUT',
  path: '/api/site',
  who: ['admin'],
  summary: 'Change the site settings; waiving a two-person rule goes on record.',
  body: siteBody,
  versioned: true,
  reply: site,
});
