import { readingOf } from '../testing/bench-reply';
import { BenchUnderTest, plain } from '../testing/bench-under-test';

const EXPECTED = {
  ripple: { low: 1.5, high: 2.3 },
  loaded: { low: 11, high: 13 },
  noLoad: { low: 15, high: 18 },
  nominal: { rippleVolts: 1.9, loadedVolts: 12, noLoadVolts: 17 },
};

describe('readings out of a spreadsheet', () => {
  beforeEach(() => localStorage.clear());

  async function paste(bench: BenchUnderTest, text: string): Promise<HTMLElement> {
    const event = new Event('paste', { bubbles: true, cancelable: true });
    Object.assign(event, { clipboardData: { getData: () => text } });
    bench.cell().dispatchEvent(event);
    return bench.dialog('qr-paste-dialog');
  }

  async function choose(bench: BenchUnderTest, dialog: HTMLElement, words: string): Promise<void> {
    const label = [...dialog.querySelectorAll('label')].find((each) => each.textContent?.includes(words));
    label?.querySelector('input')?.click();
    await bench.fixture.whenStable();
  }

  it('lie from the cell in focus on; what is kept is sent like typed readings, in one order', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    const dialog = await paste(bench, '17.2\t12.1\n17.3\t12.0');
    expect(plain(dialog.textContent)).toContain('4 readings can be kept as they are.');
    await bench.click('Keep 4 readings', dialog);
    expect(bench.cellText(2, 'loaded')).toContain('12.00');
    const [first] = bench.kept();
    expect(first).toMatchObject({
      unit: 1,
      characteristicKey: 'no_load',
      entry: { kind: 'direct', text: '17.2' },
      instrumentId: 5,
      question: null,
      repeat: null,
    });
  });

  it('are refused cell by cell, with the reason, and the others kept', async () => {
    const bench = await BenchUnderTest.open({ readings: [readingOf(2, 'no_load', 17.1)] });
    await bench.focusOn(1, 'no_load');
    const dialog = await paste(bench, '17.2\tabc\t42\n17.3\t12\n17\n17\n17\n17');
    const said = plain(dialog.textContent);
    expect(said).toContain('1 computed value is passed over.');
    expect(said).toContain('Unit 1, loaded voltage: “abc”');
    expect(said).toContain('Unit 2, no-load voltage: This cell has a reading already.');
    expect(said).toContain('Row 6: Unit 6 is not in the sample of 5.');
    expect(said).toContain('Keep 5 readings');
  });

  it('go by the names in the first row, attributes too', async () => {
    const bench = await BenchUnderTest.open();
    const dialog = await paste(
      bench,
      'Unit\tMarking\tLoaded voltage\n3\tPass\t12.1\n4\tFail: smeared\t12\n5\tFail\t12',
    );
    expect(plain(dialog.textContent)).toContain('The first row names the characteristics.');
    expect(plain(dialog.textContent)).toContain('Unit 5, marking: Write the reason behind it, as “Fail: Smeared”.');
    await bench.click('Keep 5 readings', dialog);
    expect(bench.cellText(4, 'marking')).toContain('Fail');
    expect(bench.cellText(3, 'loaded')).toContain('12.10');
  });

  it('far from what the part can give need a reason for all of them, or are left out', async () => {
    const bench = await BenchUnderTest.open({ expected: EXPECTED });
    await bench.focusOn(1, 'loaded');
    const dialog = await paste(bench, '12.1\n121\n1.2');
    expect(plain(dialog.textContent)).toContain('2 values are far from what the part can give.');
    await bench.click('Keep 1 reading', dialog);
    expect(plain(dialog.textContent)).toContain('Say what becomes of the values');
    await choose(bench, dialog, 'Leave them out');
    expect(plain(dialog.textContent)).toContain('Keep 1 reading');
    await choose(bench, dialog, 'the unit is faulty');
    await bench.click('Keep 3 readings', dialog);
    expect(bench.cellText(2, 'loaded')).toContain('121.00');
  });

  it('say what they would make of the lot', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    const dialog = await paste(bench, '17.2\n19.5');
    expect(plain(dialog.textContent)).toContain('1 unit nonconforming; a rejection number is reached.');
  });
});
