import { TestBed } from '@angular/core/testing';
import { readingOf } from '../testing/bench-reply';
import { acknowledgement, BenchUnderTest } from '../testing/bench-under-test';

describe('the bench page', () => {
  beforeEach(() => localStorage.clear());

  it('shows that it is loading, then the sample', async () => {
    const bench = new BenchUnderTest();
    expect(bench.page.querySelector('qr-loading-rows')).not.toBeNull();
    await bench.load();
    expect(bench.page.querySelectorAll('qr-grid-row')).toHaveLength(5);
    expect(bench.page.textContent).toContain('L-26-0431');
  });

  it('says in the server’s words why it did not load, and tries again', async () => {
    const bench = new BenchUnderTest();
    await bench.refuse(500, 'The database is busy.');
    expect(bench.page.textContent).toContain('The database is busy.');
    bench.page.querySelector<HTMLButtonElement>('qr-problem-note button')?.click();
    TestBed.tick();
    await bench.load();
    expect(bench.page.querySelectorAll('qr-grid-row')).toHaveLength(5);
  });

  it('says who may when the person may not', async () => {
    const bench = new BenchUnderTest('receiving');
    await bench.refuse(403, 'The bench is for inspectors.');
    expect(bench.page.querySelector('qr-no-permission')).not.toBeNull();
  });

  it('shows the sample without fields to those who only read', async () => {
    const bench = await BenchUnderTest.open({}, 'auditor');
    expect(bench.page.querySelector('qr-read-only-note')).not.toBeNull();
    await bench.press('p');
    expect(bench.page.querySelector('qr-attribute-entry')).toBeNull();
    expect(bench.kept()).toHaveLength(0);
  });

  it('starts at the first reading that is missing', async () => {
    const bench = await BenchUnderTest.open({
      readings: [readingOf(1, 'marking', true), readingOf(2, 'marking', true)],
    });
    expect(bench.panel()).toContain('Unit 3, marking');
  });

  it('passes an attribute with one key and goes down to the next unit', async () => {
    const bench = await BenchUnderTest.open();
    await bench.press('p');
    expect(bench.kept()[0]).toMatchObject({ unit: 1, entry: { kind: 'attribute', pass: true, reason: '' } });
    expect(bench.panel()).toContain('Unit 2, marking');
  });

  it('fails an attribute with F and the number of the reason', async () => {
    const bench = await BenchUnderTest.open();
    await bench.press('f');
    expect(bench.kept()).toHaveLength(0);
    await bench.press('2');
    expect(bench.kept()[0]).toMatchObject({ entry: { kind: 'attribute', pass: false, reason: 'Missing' } });
  });

  it('judges a reading as it is typed, computed characteristics too, and keeps it with Enter', async () => {
    const bench = await BenchUnderTest.open({ readings: [readingOf(1, 'no_load', 17.1)] });
    await bench.focusOn(1, 'loaded');
    const field = await bench.typeInto('qr-direct-entry input', '12');
    expect(bench.panel()).toContain('Conforming');
    expect(bench.page.querySelector('qr-grid-row [data-column="regulation"]')?.textContent).toContain('42.5');
    await bench.press('Enter', field);
    expect(bench.kept()[0]).toMatchObject({ unit: 1, characteristicKey: 'loaded', instrumentId: 5 });
    expect(bench.panel()).toContain('Unit 2, loaded voltage');
  });

  it('keeps a nonconforming reading only with the second Enter, and then stops', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto('qr-direct-entry input', '19.5');
    await bench.press('Enter', field);
    expect(bench.kept()).toHaveLength(0);
    expect(bench.panel()).toContain('It reaches the rejection number. Enter again keeps it.');
    expect(bench.page.querySelector('qr-running-verdict')?.textContent).toContain('CONTINUE');
    await bench.press('Enter', field);
    expect(bench.kept()).toHaveLength(1);
    expect(bench.page.querySelector('qr-running-verdict')?.textContent).toContain('STOP');
  });

  it('says STOP when it opens a lot whose rejection number is reached', async () => {
    const conforming = ['no_load', 'loaded'].map((key) => readingOf(1, key, 12));
    const readings = [...conforming, readingOf(1, 'marking', true), readingOf(1, 'ripple', 2.9)];
    const bench = await BenchUnderTest.open({ readings });
    expect(bench.page.querySelector('qr-running-verdict')?.textContent).toContain('STOP');
  });

  it('takes a scope reading as divisions times volts per division times probe, and remembers the scale', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'ripple');
    const height = await bench.typeInto('qr-scope-reader input[type=text]', '3.7', '0.5', '1');
    expect(bench.panel()).toContain('1.85');
    await bench.press('Enter', height);
    expect(bench.kept()[0]?.entry).toEqual({
      kind: 'scope',
      scope: { form: 'whole', divisions: 3.7, voltsPerDivision: 0.5, probeFactor: 1, coupling: 'ac' },
      typed: { divisions: '3.7', voltsPerDivision: '0.5', probeFactor: '1' },
    });
    expect(bench.panel()).toContain('Unit 2, ripple');
    const next = [...bench.page.querySelectorAll<HTMLInputElement>('qr-scope-reader input[type=text]')];
    expect(next.map(({ value }) => value)).toEqual(['', '0.5', '1']);
  });

  it('keeps the caution in view while the focus is on a characteristic that has one', async () => {
    const bench = await BenchUnderTest.open();
    expect(bench.panel()).not.toContain('Mains inside.');
    await bench.focusOn(1, 'loaded');
    expect(bench.panel()).toContain('Mains inside.');
    expect(bench.panel()).toContain('take precedence over this program');
  });

  it('does not leave a reading half typed', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    await bench.typeInto('qr-direct-entry input', '17');
    await bench.focusOn(3, 'loaded');
    expect(bench.panel()).toContain('Unit 1, no-load voltage');
    expect(bench.panel()).toContain('not kept yet');
    expect(bench.fixture.componentInstance.hasUnsaved()).toBe(true);
  });

  it('asks why before a kept reading is typed over', async () => {
    const bench = await BenchUnderTest.open({ readings: [readingOf(1, 'no_load', 17.1)] });
    await bench.focusOn(1, 'no_load');
    const clock = vi.spyOn(performance, 'now').mockReturnValue(1000);
    await bench.press('1');
    expect(document.querySelector('qr-repeat-dialog')?.textContent).toContain('17.10');
    const dialog = document.querySelector('qr-repeat-dialog') ?? bench.page;
    await bench.press('7', dialog);
    await bench.press('3', dialog);
    expect(dialog.querySelector('input:checked')).toBeNull();
    clock.mockReturnValue(1400);
    await bench.press('2', dialog);
    clock.mockRestore();
    document.querySelector<HTMLButtonElement>('qr-repeat-dialog button[type=submit]')?.click();
    await bench.fixture.whenStable();
    await vi.waitFor(() => expect(bench.panel()).toContain('Repeat 1 of 2: wrong range or scale'));
    const field = await bench.typeInto('qr-direct-entry input', '17.3');
    await bench.press('Enter', field);
    expect(bench.kept()[0]).toMatchObject({ repeat: { reason: 'wrong-range', note: '' } });
  });

  it('takes the last kept reading back with Ctrl and Z', async () => {
    const bench = await BenchUnderTest.open();
    await bench.press('p');
    const [keeping] = bench.sent();
    keeping?.flush(acknowledgement(keeping, true));
    await bench.fixture.whenStable();
    await bench.press('z', bench.cell(), { ctrlKey: true });
    bench.http.expectOne(`${keeping?.request.url}/withdrawal`);
    expect(bench.cellText(1, 'marking')).toBe('');
  });

  it('refuses to submit while readings are missing, and goes to the first of them', async () => {
    const bench = await BenchUnderTest.open({ readings: [readingOf(1, 'marking', true)] });
    await bench.focusOn(4, 'ripple');
    await bench.click('Submit');
    expect(bench.panel()).toContain('19 readings are missing. This is the first.');
    expect(bench.panel()).toContain('Unit 2, marking');
  });
});
