import { type Characteristic, type Plan, type Revision } from '#shared/contract/plans';
import { type Role } from '#shared/contract/roles';
import { openPage, problem } from '../../../testing/open-page';
import { newCharacteristic } from '../editor/new-characteristic';
import { PlanPage } from './plan-page';

const RIPPLE = { ...newCharacteristic('measured'), key: 'ripple', name: 'Ripple', upperLimit: 2.4 } as Characteristic;
const PART = { id: 5, number: 'WA-12-500', name: 'Wall adapter 12 V, 500 mA' };

function revision(number: number, status: Revision['status'], authorId: number): Revision {
  return {
    id: number,
    revision: number,
    status,
    version: 3,
    decisionRule: 'simple',
    author: 'R. Okonvei',
    authorId,
    approver: null,
    createdAt: '2026-03-12T14:20:00.000Z',
    submittedAt: null,
    effectiveAt: null,
    retiredAt: null,
    level: 'II',
    classAqls: [{ class: 'major', aql: '1.0' }],
    characteristics: [RIPPLE],
    changeNote: '',
  };
}

function planWith(only: Revision, approveOwn = false): Plan {
  const open = only.status === 'draft' || only.status === 'in-review';
  return {
    id: 1,
    number: 'P-014',
    part: PART,
    effectiveRevision: open ? null : only.revision,
    openRevision: open ? { revision: only.revision, status: only.status as 'draft' } : null,
    characteristics: 1,
    effectiveAt: null,
    revisions: [only],
    approveOwn,
  };
}

async function openPlan(plan: Plan, role: Role = 'quality') {
  const page = await openPage(PlanPage, [role], { id: 1 });
  await page.answer('/api/plans/1', plan);
  return page;
}

const button = (element: HTMLElement, name: string) =>
  [...element.querySelectorAll('button')].find((each) => each.textContent?.trim() === name);

describe('PlanPage', () => {
  it('lets quality edit a draft, and saves it by the version it started from', async () => {
    const page = await openPlan(planWith(revision(5, 'draft', 1)));
    await page.type('Upper limit', '2.5');
    expect(page.text()).toContain('Not saved yet');
    await page.press('Save draft');
    const request = page.http.expectOne('/api/plans/1/revisions/5');
    expect(request.request.headers.get('If-Match')).toBe('"3"');
    expect(request.request.body).toMatchObject({ characteristics: [{ key: 'ripple', upperLimit: 2.5 }] });
  });

  it('says what is wrong while it is typed, and does not offer to save it', async () => {
    const page = await openPlan(planWith(revision(5, 'draft', 1)));
    await page.type('Upper limit', 'two');
    expect(page.text()).toContain('One thing is to be mended');
    expect(button(page.element, 'Save draft')?.disabled).toBe(true);
  });

  it('shows a draft that somebody else saved meanwhile beside what was typed', async () => {
    const mine = revision(5, 'draft', 1);
    const page = await openPlan(planWith(mine));
    await page.type('Upper limit', '2.5');
    await page.press('Save draft');
    await page.answer('/api/plans/1/revisions/5', problem(412, 'Changed meanwhile.'), 412);
    const theirs = { ...mine, version: 4, characteristics: [{ ...RIPPLE, upperLimit: 2.6 } as Characteristic] };
    await page.answer('/api/plans/1', planWith(theirs));
    const note = page.element.querySelector('qr-conflict-note')?.textContent;
    expect(note).toContain('max 2.50');
    expect(note).toContain('max 2.60');
  });

  it('does not let its author approve a revision, and says why', async () => {
    const page = await openPlan(planWith(revision(5, 'in-review', 1)));
    expect(button(page.element, 'Approve revision 5')?.disabled).toBe(true);
    expect(page.text()).toContain('You wrote this revision; somebody else approves it.');
  });

  it('lets its author approve it where the site waives the rule', async () => {
    const page = await openPlan(planWith(revision(5, 'in-review', 1), true));
    expect(button(page.element, 'Approve revision 5')?.disabled).toBe(false);
  });

  it('shows a reader what is in force, without a field', async () => {
    const page = await openPlan(planWith(revision(5, 'effective', 2)), 'inspector');
    expect(page.text()).toContain('Revision 5 is in force and cannot be edited.');
    expect(page.element.querySelector('qr-characteristic-fields')).toBeNull();
    expect(button(page.element, 'Make revision 6')).toBeUndefined();
  });
});
