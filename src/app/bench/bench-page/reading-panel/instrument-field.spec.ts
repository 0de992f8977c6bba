import { type Instrument } from '#shared/contract/instruments';
import { benchReply } from '../../testing/bench-reply';
import { BenchUnderTest, plain } from '../../testing/bench-under-test';

const DIRECT = 'qr-direct-entry input';

function instrument(change: Partial<Instrument>): Instrument {
  const [first] = benchReply().instruments;
  if (first === undefined) throw new Error('The bench has no instrument.');
  return { ...first, ...change };
}

const REFERENCE = { name: '10 V reference R-2', unit: 'V', value: 10, tolerance: 0.01 } as const;

describe('the instrument that takes a reading', () => {
  beforeEach(() => localStorage.clear());

  it('reads on the smallest range that holds the value, and says when none does', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto(DIRECT, '17.2');
    expect(bench.panel()).toContain('Automatic 20 V');
    await bench.typeInto(DIRECT, '25');
    expect(bench.panel()).toContain('Automatic 200 V');
    await bench.typeInto(DIRECT, '250');
    await bench.press('Enter', field);
    expect(bench.kept()).toHaveLength(0);
    expect(bench.panel()).toContain('250 V is above every range of this instrument.');
  });

  it('is remembered with its range', async () => {
    localStorage.setItem(
      'quietrail.bench',
      JSON.stringify({ instruments: { multimeter: 5 }, ranges: { '5 V direct': 52 } }),
    );
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    await bench.press('Enter', await bench.typeInto(DIRECT, '17.2'));
    expect(bench.kept()[0]).toMatchObject({ instrumentId: 5, rangeId: 52 });
  });

  it('is offered with the reason where it may not be used', async () => {
    const withdrawn = instrument({ id: 8, assetNumber: 'DM-20', status: 'withdrawn', usable: false });
    const overdue = instrument({
      id: 9,
      assetNumber: 'DM-21',
      calibrationDue: '2026-02-21',
      daysLeft: -19,
      usable: false,
    });
    const bench = await BenchUnderTest.open({ instruments: [instrument({}), withdrawn, overdue] });
    await bench.focusOn(1, 'no_load');
    bench.page.querySelector<HTMLElement>('qr-instrument-field .mat-mdc-select-trigger')?.click();
    await bench.fixture.whenStable();
    const options = [...document.querySelectorAll('mat-option')];
    const said = options.map((option) => plain(option.textContent));
    expect(said.find((text) => text.includes('DM-20'))).toContain('withdrawn');
    expect(said.find((text) => text.includes('DM-21'))).toContain('past its calibration date 2026-02-21');
    expect(options.map((option) => option.getAttribute('aria-disabled'))).toEqual(['false', 'true', 'true']);
  });

  it('is checked against its reference before its first reading of the day, right there', async () => {
    const due = instrument({ dailyCheck: 'due', usable: false, dailyReference: REFERENCE });
    const bench = await BenchUnderTest.open({ instruments: [due] });
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto(DIRECT, '17.2');
    await bench.press('Enter', field);
    expect(bench.kept()).toHaveLength(0);
    expect(bench.panel()).toContain('Check DM-11 against its reference before its first reading today.');
    expect(bench.panel()).toContain('10 V reference R-2');

    const record = async (text: string, passed: boolean) => {
      await bench.typeInto('qr-daily-check input', text);
      await bench.click('Record check');
      const check = bench.http.expectOne('/api/instruments/5/checks');
      const { observed } = check.request.body as { observed: number };
      const made = { id: 1, day: '2026-03-12', observed, reference: 10, tolerance: 0.01, passed };
      check.flush(
        { ...made, at: '2026-03-12T08:00:00.000Z', person: 'I. Sandvær' },
        { status: 201, statusText: 'Made' },
      );
      await bench.fixture.whenStable();
      return observed;
    };
    expect(await record('10.2', false)).toBe(10.2);
    expect(bench.panel()).toContain('The instrument cannot be used until a check passes.');
    await record('10.004', true);
    expect(bench.panel()).not.toContain('reference R-2');
    await bench.press('Enter', bench.page.querySelector(DIRECT) ?? bench.page);
    expect(bench.kept()[0]).toMatchObject({ instrumentId: 5 });
  });
});
