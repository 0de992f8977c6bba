import { type Reading } from '#shared/contract/bench';
import { readingOf } from '../testing/bench-reply';
import { BenchUnderTest, plain } from '../testing/bench-under-test';

const DIRECT = 'qr-direct-entry input';

/** A reading of the multimeter's 20 V range. */
const onRange = (unit: number, key: string, value: number): Reading => ({
  ...readingOf(unit, key, value),
  instrumentId: 5,
  rangeId: 51,
});

describe('a plan that judges with guard bands', () => {
  beforeEach(() => localStorage.clear());

  it('shows a reading too near its limit as conditional, and its unit as undecided', async () => {
    const bench = await BenchUnderTest.open({
      decisionRule: 'non-binary',
      readings: [onRange(1, 'no_load', 18.195)],
    });
    const cell = bench.page.querySelector('[data-column="no_load"]');
    expect(cell?.getAttribute('aria-label')).toContain('conditional');
    expect(cell?.classList).toContain('look-hold');
    await bench.focusOn(1, 'no_load');
    expect(bench.panel()).toContain('Conditional, inside the limit');
    expect(bench.panel()).toMatch(/Accept to 18\.18\d V\. Guard band 0\.01\d V\./);
  });

  it('judges a typed reading by the uncertainty of the range that the server will take', async () => {
    const bench = await BenchUnderTest.open({ decisionRule: 'guarded' });
    await bench.focusOn(1, 'no_load');
    await bench.typeInto(DIRECT, '18.195');
    expect(bench.panel()).toContain('Nonconforming');
    expect(bench.panel()).toContain('Automatic 20 V');
    expect(bench.panel()).toMatch(/± 0\.01\d V ?k = 2, 0\.05 % \+ 2 counts/);
    await bench.typeInto(DIRECT, '17');
    expect(bench.panel()).toContain('Conforming');
  });

  it('keeps no reading whose uncertainty is not known', async () => {
    const bench = await BenchUnderTest.open({ decisionRule: 'guarded' });
    await bench.focusOn(1, 'ripple');
    const height = await bench.typeInto('qr-scope-reader input[type=text]', '3.7', '0.5', '1');
    await bench.press('Enter', height);
    expect(bench.kept()).toHaveLength(0);
    expect(bench.panel()).toContain('its uncertainty is not known');
  });

  it('lets quality rule on the undecided unit, and shows the ruling on it', async () => {
    const bench = await BenchUnderTest.open(
      { decisionRule: 'non-binary', readings: [onRange(1, 'no_load', 18.195)] },
      'quality',
    );
    await bench.focusOn(1, 'no_load');
    await bench.click('Rule on unit');
    const dialog = await bench.dialog('qr-ruling-dialog');
    expect(plain(dialog.textContent)).toContain('Its no-load voltage is conditional');
    dialog.querySelectorAll<HTMLInputElement>('input[type=radio]')[0]?.click();
    const reason = dialog.querySelector('textarea');
    if (reason) reason.value = 'Measured at the laboratory: 18.16 V';
    reason?.dispatchEvent(new Event('input'));
    dialog.querySelector<HTMLButtonElement>('button[type=submit]')?.click();
    const ruled = bench.http.expectOne('/api/lots/12/units/1/ruling');
    expect(ruled.request.body).toEqual({ ruling: 'conforming', reason: 'Measured at the laboratory: 18.16 V' });
    ruled.flush({ done: true });
    await bench.fixture.whenStable();
    expect(bench.panel()).toContain('Ruled conforming by I. Sandvær: Measured at the laboratory: 18.16 V');
    await vi.waitFor(() => expect(document.querySelector('qr-ruling-dialog')).toBeNull());
  });

  it('does not offer a ruling to inspectors', async () => {
    const bench = await BenchUnderTest.open({
      decisionRule: 'non-binary',
      readings: [onRange(1, 'no_load', 18.195)],
    });
    await bench.focusOn(1, 'no_load');
    expect(bench.panel()).not.toContain('Rule on unit');
  });
});
