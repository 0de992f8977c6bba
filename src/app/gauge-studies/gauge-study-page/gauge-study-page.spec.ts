import { type GaugeStudy } from '#shared/contract/gauge-studies';
import { type Role } from '#shared/contract/roles';
import { type OpenPage, openPage, problem } from '../../../testing/open-page';
import { CLOSED_STUDY, OPEN_STUDY } from '../../../testing/study-samples';
import { GaugeStudyPage } from './gauge-study-page';

const URL = '/api/gauge-studies/4';
const LAST = 'Unit 2, P. Lindqvar, trial 2';

async function open(study: GaugeStudy, role: Role): Promise<OpenPage<GaugeStudyPage>> {
  const page = await openPage(GaugeStudyPage, [role], { id: 4 });
  await page.answer(URL, study);
  return page;
}

function cell({ element }: OpenPage<GaugeStudyPage>, name: string): HTMLInputElement {
  const found = element.querySelector<HTMLInputElement>(`input[aria-label="${name}"]`);
  if (!found) throw new Error(`There is no cell "${name}".`);
  return found;
}

async function typeInto(page: OpenPage<GaugeStudyPage>, name: string, text: string): Promise<void> {
  const input = cell(page, name);
  input.value = text;
  input.dispatchEvent(new Event('input', { bubbles: true }));
  await page.fixture.whenStable();
}

async function pasteInto(page: OpenPage<GaugeStudyPage>, name: string, text: string): Promise<Event> {
  const event = new Event('paste', { bubbles: true, cancelable: true });
  Object.assign(event, { clipboardData: { getData: () => text } });
  cell(page, name).dispatchEvent(event);
  await page.fixture.whenStable();
  return event;
}

describe('GaugeStudyPage of an open study', () => {
  it('saves what is typed, with the version it began from', async () => {
    const page = await open(OPEN_STUDY, 'quality');
    expect(page.text()).toContain('1 are missing');
    await typeInto(page, LAST, '12.4');
    expect(page.text()).toContain('8 of 8 entered');
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(true);
    await page.press('Save readings');
    const { request } = page.http.expectOne(URL);
    expect(request.method).toBe('PUT');
    expect(request.headers.get('If-Match')).toBe('"2"');
    expect((request.body as GaugeStudy).values[1]?.[1]).toEqual([12.42, 12.4]);
  });

  it('names the cell that nobody can read, keeps what was typed, and saves nothing', async () => {
    const page = await open(OPEN_STUDY, 'quality');
    await typeInto(page, LAST, '1,,2');
    expect(cell(page, LAST).getAttribute('aria-invalid')).toBe('true');
    expect(page.text()).toContain(`${LAST} : “1,,2”`);
    await page.press('Save readings');
    page.http.expectNone(URL);
    expect(cell(page, LAST).value).toBe('1,,2');
  });

  it('takes a block of a spreadsheet, and refuses one that has no room', async () => {
    const page = await open(OPEN_STUDY, 'quality');
    const event = await pasteInto(page, 'Unit 1, P. Lindqvar, trial 1', '12.5\t12.6\n12.7\t12.8\n');
    expect(event.defaultPrevented).toBe(true);
    expect(cell(page, LAST).value).toBe('12.8');
    await pasteInto(page, LAST, '1\t2');
    expect(page.text()).toContain('there is room for 1 row and 1 column. Nothing was placed.');
    expect(cell(page, LAST).value).toBe('12.8');
  });

  it('leaves a single value to the cell it is pasted into', async () => {
    const page = await open(OPEN_STUDY, 'quality');
    expect((await pasteInto(page, LAST, '12.4')).defaultPrevented).toBe(false);
  });

  it('shows both values of a cell when somebody else saved first, and keeps what was typed', async () => {
    const page = await open(OPEN_STUDY, 'quality');
    await typeInto(page, LAST, '12.4');
    await page.press('Save readings');
    await page.answer(URL, problem(412, 'Changed meanwhile.'), 412);
    const values = OPEN_STUDY.values.map((rows) => rows.map((trials) => trials.map((value) => value ?? 12.3)));
    await page.answer(URL, { ...OPEN_STUDY, values, entered: 8, version: 3 });
    const note = page.element.querySelector('qr-conflict-note')?.textContent;
    expect(note).toContain(LAST);
    expect(note).toContain('12.30');
    await page.press('Keep what I typed');
    await page.press('Save readings');
    const { request } = page.http.expectOne(URL);
    expect(request.headers.get('If-Match')).toBe('"3"');
    expect((request.body as GaugeStudy).values[1]?.[1]?.[1]).toBe(12.4);
  });

  it('is read-only to everybody but quality', async () => {
    const page = await open(OPEN_STUDY, 'inspector');
    expect(page.text()).toContain('Gauge studies are kept by quality.');
    expect(page.element.querySelector('qr-readings-grid')).toBeNull();
    expect(page.text()).toContain('12.42');
  });
});

describe('GaugeStudyPage of a closed study', () => {
  it('shows the verdict in words, both methods, and what is rough of a small study', async () => {
    const page = await open(CLOSED_STUDY, 'quality');
    expect(page.element.querySelector('qr-verdict-sheet')?.textContent).toContain('Acceptable');
    expect(page.text()).toContain('By analysis of variance');
    expect(page.text()).toContain('By average and range');
    expect(page.text()).toContain('Fewer than 10 parts');
    expect(page.element.querySelector('a[href="/api/gauge-studies/4/file"]')).not.toBeNull();
    expect(page.element.querySelector('qr-readings-grid')).toBeNull();
  });

  it('says that a study is not there', async () => {
    const page = await openPage(GaugeStudyPage, ['quality'], { id: 4 });
    await page.answer(URL, problem(404, 'This gauge study does not exist.'), 404);
    expect(page.text()).toContain('This gauge study does not exist.');
  });
});
