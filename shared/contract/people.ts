import * as z from 'zod';
import { byId, endpoint } from './endpoint';
import { id, line, mailAddress, moment, version } from './fields';
import { role } from './roles';

const READERS = ['auditor', 'admin'] as const;

export const personBody = z.object({
  name: line(80),
  email: mailAddress,
  stampNumber: z
    .string()
    .trim()
    .regex(/^\d{1,4}$/, 'A stamp number has one to four digits.')
    .nullable(),
  roles: z.array(role).min(1, 'Give at least one role.'),
});

export const person = z.object({
  id,
  name: z.string(),
  email: z.string(),
  stampNumber: z.string().nullable(),
  roles: z.array(role),
  active: z.boolean(),
  hasPassword: z.boolean(),
  lastSignIn: moment.nullable(),
  version,
});
export type Person = z.infer<typeof person>;

/** A one-time link, shown once to the administrator, who hands it over. */
const oneTimeLink = z.object({ person, link: z.string(), expires: moment });

export const listPeople = endpoint({
  method: 'GET',
  path: '/api/people',
  who: READERS,
  summary: 'Everybody with an account.',
  reply: z.object({ items: z.array(person) }),
});

export const addPerson = endpoint({
  method: 'POST',
  path: '/api/people',
  who: ['admin'],
  summary: 'Create an account; the reply holds the one-time link with which the person sets a password.',
  body: personBody,
  status: 201,
  reply: oneTimeLink,
});

export const changePerson = endpoint({
  method: 'PUT',
  path: '/api/people/:id',
  who: ['admin'],
  summary: 'Change name, e-mail, stamp, roles, or whether the account is active; the last administrator stays.',
  params: byId,
  body: personBody.extend({ active: z.boolean() }),
  versioned: true,
  reply: person,
});

export const resetPerson = endpoint({
  method: 'POST',
  path: '/api/people/:id/reset',
  who: ['admin'],
  summary: 'End all sessions of a person and make a one-time link for a new password.',
  params: byId,
  reply: oneTimeLink,
});
