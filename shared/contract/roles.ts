import * as z from 'zod';

/** The roles a person may hold, several at once; what each may do is written beside every endpoint. */
export const ROLES = ['receiving', 'inspector', 'quality', 'engineering', 'auditor', 'admin'] as const;

export const role = z.enum(ROLES);
export type Role = z.infer<typeof role>;

/** What a page calls the role. */
export const ROLE_TITLES: Record<Role, string> = {
  receiving: 'Receiving',
  inspector: 'Inspector',
  quality: 'Quality engineer',
  engineering: 'Engineering',
  auditor: 'Auditor',
  admin: 'Administrator',
};

/** Everybody whose work is lots: all roles but the administrator, who makes no quality rulings. */
export const LOT_READERS = [
  'receiving',
  'inspector',
  'quality',
  'engineering',
  'auditor',
] as const satisfies readonly Role[];
