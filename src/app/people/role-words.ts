import { type Role } from '#shared/contract/roles';

/** What each role may do, in a line. */
export const ROLE_LINES: Readonly<Record<Role, string>> = {
  receiving: 'Books lots in and corrects them, keeps suppliers.',
  inspector: 'Draws samples, takes readings, submits lots.',
  quality: 'Decides lots, keeps parts, plans and instruments, handles nonconformances.',
  engineering: 'Answers nonconformances, rules on concessions, proposes changes.',
  auditor: 'Reads everything and checks the audit trail; changes nothing.',
  admin: 'Keeps people, site settings and the mail queue; makes no quality rulings.',
};
