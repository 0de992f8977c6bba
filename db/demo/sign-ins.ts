import { type Role } from '#shared/contract/roles';

/** The one password of everybody in the demo; production refuses to know it. */
export const DEMO_PASSWORD = 'quiet-rail-demo-2026';

/** The people of the demo, invented; the first holder of each role is listed on the sign-in page. */
export const DEMO_SIGN_INS: readonly {
  name: string;
  email: string;
  stampNumber: string | null;
  roles: readonly Role[];
}[] = [
  { name: 'T. Brekkan', email: 'receiving@hollowmere.example', stampNumber: null, roles: ['receiving'] },
  { name: 'I. Sandvær', email: 'inspector@hollowmere.example', stampNumber: '07', roles: ['inspector'] },
  { name: 'P. Lindqvar', email: 'inspector2@hollowmere.example', stampNumber: '11', roles: ['inspector'] },
  { name: 'M. Aldoush', email: 'quality@hollowmere.example', stampNumber: '02', roles: ['quality'] },
  { name: 'R. Okonvei', email: 'quality2@hollowmere.example', stampNumber: '03', roles: ['quality'] },
  { name: 'J. Thorsby', email: 'engineering@hollowmere.example', stampNumber: null, roles: ['engineering'] },
  { name: 'E. Vantreau', email: 'auditor@hollowmere.example', stampNumber: null, roles: ['auditor'] },
  { name: 'K. Minde', email: 'admin@hollowmere.example', stampNumber: null, roles: ['admin'] },
];
