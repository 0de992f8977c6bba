import { type Reading } from '#shared/contract/bench';
import { benchReply, readingOf } from '../testing/bench-reply';
import { BenchUnderTest } from '../testing/bench-under-test';

const byOther = (unit: number, key: string, worth: number | boolean) => ({
  ...readingOf(unit, key, worth),
  takenBy: 'P. Lindqvar',
});

const benchOf = (readings: Reading[]) => benchReply({ readings });

describe('two inspectors on one lot', () => {
  beforeEach(() => localStorage.clear());

  it('see each other’s readings arrive, and for two seconds whose they are', async () => {
    const bench = await BenchUnderTest.open();
    await bench.change([byOther(3, 'no_load', 17.1)]);
    expect(bench.cellText(3, 'no_load')).toContain('17.10');
    expect(bench.cellText(3, 'no_load')).toContain('PL');
    await vi.waitFor(() => expect(bench.cellText(3, 'no_load')).not.toContain('PL'), 3000);
  });

  it('are told at once when the other fills the very cell that is being typed in', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    await bench.typeInto('qr-direct-entry input', '17.3');
    await bench.change([byOther(1, 'no_load', 17.1)]);
    expect(bench.panel()).toContain('P. Lindqvar has just kept 17.10 V here.');
    await bench.press('Enter', bench.page.querySelector('qr-direct-entry input') ?? bench.page);
    expect(bench.kept()).toHaveLength(0);
    expect(document.querySelector('qr-repeat-dialog')?.textContent).toContain('17.10');
  });

  it('never overwrite each other: both values stand side by side, and one is chosen', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    await bench.press('Enter', await bench.typeInto('qr-direct-entry input', '17.3'));
    const refusal = { status: 409, code: 'reading-there-already', title: 'Unit 1 has this reading already.' };
    await bench.refuseReading(bench.sent()[0], refusal, benchOf([byOther(1, 'no_load', 17.1)]));
    await bench.focusOn(1, 'no_load');
    expect(bench.panel()).toContain('Somebody else was here first.');
    expect(bench.panel()).toMatch(/Kept17\.10 VP\. Lindqvar.*Yours17\.30 VI\. Sandvær/);
    expect(bench.cellText(1, 'no_load')).toContain('17.10');
    await bench.click('Keep theirs, drop mine');
    expect(bench.panel()).not.toContain('Somebody else was here first.');
  });

  it('do not lose what they are typing, or a question they are answering', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto('qr-direct-entry input', '19.5');
    await bench.press('Enter', field);
    await bench.change([byOther(3, 'no_load', 17.1)]);
    expect(bench.panel()).toContain('Enter again keeps it.');
    await bench.press('Enter', field);
    expect(bench.kept()[0]).toMatchObject({ unit: 1, entry: { text: '19.5' } });
  });

  it('see the lot stop', async () => {
    const bench = await BenchUnderTest.open();
    await bench.change([byOther(2, 'no_load', 30), byOther(2, 'loaded', 12), byOther(2, 'ripple', 1.8)]);
    expect(bench.page.querySelector('qr-running-verdict')?.textContent).toContain('STOP');
  });

  it('see the lot leave the bench', async () => {
    const bench = await BenchUnderTest.open();
    const reply = benchOf([]);
    await bench.change([], { ...reply, lot: { ...reply.lot, status: 'submitted' } });
    expect(bench.page.querySelector('qr-read-only-note')?.textContent).toContain('This lot has left the bench');
  });
});
