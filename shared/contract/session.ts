import * as z from 'zod';
import { done, endpoint } from './endpoint';
import { id, line, mailAddress, newPassword } from './fields';
import { role } from './roles';

/** The person who is signed in. */
export const me = z.object({
  id,
  name: z.string(),
  email: z.string(),
  stampNumber: z.string().nullable(),
  roles: z.array(role),
});
export type Me = z.infer<typeof me>;

export const signIn = endpoint({
  method: 'POST',
  path: '/api/session',
  who: 'anyone',
  summary: 'Sign in with e-mail and password; the session lives in httpOnly cookies.',
  body: z.object({
    email: mailAddress,
    password: z.string().min(1, 'Type the password.').max(200),
    keep: z.boolean().default(false),
  }),
  reply: me,
});

export const readMe = endpoint({
  method: 'GET',
  path: '/api/session',
  who: 'signed-in',
  summary: 'The person who is signed in.',
  reply: me,
});

export const refreshSession = endpoint({
  method: 'POST',
  path: '/api/session/refresh',
  who: 'anyone',
  summary: 'Exchange the refresh cookie for a new pair; a refresh cookie used twice ends the session.',
  reply: me,
});

export const signOut = endpoint({
  method: 'DELETE',
  path: '/api/session',
  who: 'anyone',
  summary: 'End this session.',
  reply: done,
});

export const changePassword = endpoint({
  method: 'PUT',
  path: '/api/session/password',
  who: 'signed-in',
  summary: 'Change the own password; every other session of the person ends.',
  body: z.object({ password: z.string().min(1, 'Type the password you have now.').max(200), newPassword }),
  reply: done,
});

const token = z.string().min(20).max(200);

export const readOneTimeLink = endpoint({
  method: 'POST',
  path: '/api/one-time-link/read',
  who: 'anyone',
  summary: 'What a one-time link is for; reading it does not use it up.',
  body: z.object({ token }),
  reply: z.object({
    purpose: z.enum(['first-admin', 'set-password']),
    name: z.string().nullable(),
    email: z.string().nullable(),
  }),
});

export const openSite = endpoint({
  method: 'POST',
  path: '/api/one-time-link/first-admin',
  who: 'anyone',
  summary: 'Create the first administrator of an empty site with the one-time set-up link.',
  body: z.object({ token, name: line(80), email: mailAddress, newPassword }),
  reply: done,
});

export const setPassword = endpoint({
  method: 'POST',
  path: '/api/one-time-link/password',
  who: 'anyone',
  summary: 'Set a password with the one-time link an administrator handed over.',
  body: z.object({ token, newPassword }),
  reply: done,
});
