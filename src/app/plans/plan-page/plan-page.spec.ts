import { type Characteristic, type Plan, type Revision } from '#shared/contract/plans';
import { type Role } from '#shared/contract/roles';
import { openPage, problem } from '../../../testing/open-page';
import { newCharacteristic } from '../editor/new-characteristic';
import { PlanPage } from './plan-page';

const RIPPLE = { ...newCharacteristic('measured'), key: 'ripple', name: 'Ripple', upperLimit: 2.4 } as Characteristic;
const PART = { id: 5, number: 'WA-12-500', name: 'Wall adapter 12 V, 500 mA' };

const METER = {
  id: 1,
  version: 1,
  assetNumber: 'MM-01',
  kind: 'multimeter',
  description: 'Bench multimeter',
  serialNumber: '',
  place: '',
  status: 'in-service',
  dailyReference: null,
  calibrationDue: '2027-01-31',
  dailyCheck: 'not-asked',
  openReview: null,
  usable: true,
  daysLeft: 60,
  ranges: [
    {
      id: 1,
      form: 'digital',
      name: '20 V',
      unit: 'V',
      current: 'dc',
      fullScale: 20,
      resolution: 0.01,
      ofReading: 0.05,
      ofRange: 0,
      counts: 2,
    },
  ],
};

function revision(number: number, status: Revision['status'], authorId: number): Revision {
  return {
    id: number,
    revision: number,
    status,
    version: 3,
    decisionRule: 'simple',
    coverageFactor: 2,
    warmUpMinutes: null,
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

  it('chooses a decision rule by what it does, with k and the warm-up', async () => {
    const page = await openPlan(planWith(revision(5, 'draft', 1)));
    const guarded = [...page.element.querySelectorAll<HTMLElement>('mat-radio-button')].find((each) =>
      each.textContent.includes('Guarded acceptance'),
    );
    expect(guarded?.textContent).toContain('drawn in by U');
    guarded?.querySelector('input')?.click();
    await page.type('Coverage factor k', '1.65');
    await page.type('Warm-up before measuring', '15');
    await page.press('Save draft');
    const { body } = page.http.expectOne('/api/plans/1/revisions/5').request;
    expect(body).toMatchObject({ decisionRule: 'guarded', coverageFactor: 1.65, warmUpMinutes: 15 });
  });

  it('puts what is wrong with k beside its field', async () => {
    const page = await openPlan(planWith(revision(5, 'draft', 1)));
    await page.type('Coverage factor k', '9');
    expect(page.element.querySelector('qr-decision-sheet mat-error')?.textContent).toContain('At most 4.');
    await page.type('Coverage factor k', 'two');
    expect(button(page.element, 'Save draft')?.disabled).toBe(true);
  });

  it('tells which guard band leaves nothing with the instruments of the site', async () => {
    const plan = planWith({ ...revision(5, 'draft', 1), decisionRule: 'guarded' });
    const [characteristic] = plan.revisions[0]?.characteristics ?? [];
    Object.assign(characteristic ?? {}, { lowerLimit: 2.3, upperLimit: 2.4 });
    const page = await openPlan(plan);
    await page.answer('/api/instruments', { items: [METER] });
    expect(page.text()).toContain('One thing is to be mended before the plan can be approved.');
    expect(page.element.querySelector('qr-limit-fields mat-error')?.textContent).toContain('leave nothing to accept');
    expect(page.element.querySelector('qr-guard-table')?.textContent).toContain('nothing');
  });

  it('shows the method note and the caution of what is measured', async () => {
    const plan = planWith(revision(5, 'effective', 2));
    plan.revisions[0]?.characteristics.splice(0, 1, { ...RIPPLE, measurand: 'ripple' } as Characteristic);
    const page = await openPlan(plan, 'inspector');
    expect(page.text()).toContain('Couple the channel AC');
    expect(page.element.querySelector('qr-caution-note')?.textContent).toContain('earth lead');
  });
});
