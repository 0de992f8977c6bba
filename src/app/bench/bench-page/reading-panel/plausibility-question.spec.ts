import { type ExpectedBands } from '#shared/contract/parts';
import { readingOf } from '../../testing/bench-reply';
import { BenchUnderTest, plain } from '../../testing/bench-under-test';

const EXPECTED: ExpectedBands = {
  ripple: { low: 1.5, high: 2.3 },
  loaded: { low: 11, high: 13 },
  noLoad: { low: 15, high: 18 },
  nominal: { rippleVolts: 1.9, loadedVolts: 12, noLoadVolts: 17 },
};
const SCOPE = 'qr-scope-reader input[type=text]';
const DIRECT = 'qr-direct-entry input';

describe('a reading far from what the part can give', () => {
  let clock: { mockReturnValue(now: number): unknown };
  let now = 1000;

  const asked = (bench: BenchUnderTest) => bench.page.querySelector('qr-plausibility-question');

  /** A pause, after which keys are meant for the question. */
  const pause = () => clock.mockReturnValue((now += 1000));

  async function scopeSlip(): Promise<BenchUnderTest> {
    const bench = await BenchUnderTest.open({ expected: EXPECTED });
    await bench.focusOn(1, 'ripple');
    const height = await bench.typeInto(SCOPE, '3.7', '0.5', '10');
    await bench.press('Enter', height);
    return bench;
  }

  beforeEach(() => {
    localStorage.clear();
    clock = vi.spyOn(performance, 'now').mockReturnValue(now);
  });
  afterEach(() => vi.restoreAllMocks());

  it('is questioned before it is kept, with the expected band, the slip and what it would mean', async () => {
    const bench = await scopeSlip();
    expect(bench.kept()).toHaveLength(0);
    const question = plain(asked(bench)?.textContent);
    expect(question).toContain('1.50 to 2.30 V p-p');
    expect(question).toContain('ten times less would fit');
    expect(question).toContain('Nonconforming: Ripple 18.50 V p-p, max 2.40 V p-p. It reaches the rejection number.');
  });

  it('is corrected with F2, and what stood there goes on record', async () => {
    const bench = await scopeSlip();
    await bench.press('F2', asked(bench) ?? bench.page);
    expect(asked(bench)).toBeNull();
    expect(bench.panel()).toContain('Corrected from 18.50 V p-p');
    await bench.press('Enter', bench.page.querySelector(SCOPE) ?? bench.page);
    const [kept] = bench.kept();
    expect(kept?.entry).toMatchObject({ scope: { probeFactor: 1 }, typed: { probeFactor: '1' } });
    expect(kept?.question).toMatchObject({
      answer: 'corrected',
      fromValue: 18.5,
      from: { kind: 'scope', scope: { probeFactor: 10 } },
    });
  });

  it('is kept with a reason of the list; keys typed on without looking choose none', async () => {
    const bench = await scopeSlip();
    const question = asked(bench) ?? bench.page;
    await bench.press('2', question);
    expect(question.querySelector('input:checked')).toBeNull();
    pause();
    await bench.press('Enter', question);
    expect(plain(question.textContent)).toContain('Choose a reason.');
    await bench.press('2', question);
    await bench.press('Enter', question);
    expect(bench.kept()[0]?.question).toEqual({ answer: 'confirmed', reason: 'known-fault', note: '' });
    expect(bench.panel()).toContain('Unit 2, ripple');
  });

  it('needs a few words where the reason is another one', async () => {
    const bench = await scopeSlip();
    const question = asked(bench) ?? bench.page;
    pause();
    await bench.press('5', question);
    await bench.press('Enter', question);
    expect(bench.kept()).toHaveLength(0);
    await bench.typeInto('qr-plausibility-question .note input', 'Other capacitor');
    await bench.press('Enter', question);
    expect(bench.kept()[0]?.question).toMatchObject({ reason: 'other', note: 'Other capacitor' });
  });

  it('goes back to the fields with Esc; what is typed then is a correction too', async () => {
    const bench = await BenchUnderTest.open({ expected: EXPECTED });
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto(DIRECT, '1.72');
    await bench.press('Enter', field);
    expect(plain(asked(bench)?.textContent)).toContain('Look at the decimal point');
    await bench.press('Escape', asked(bench) ?? bench.page);
    await bench.typeInto(DIRECT, '17.1');
    await bench.press('Enter', field);
    expect(bench.kept()[0]).toMatchObject({
      entry: { text: '17.1' },
      question: { answer: 'corrected', from: { kind: 'direct', text: '1.72' }, fromValue: 1.72 },
    });
  });

  it('is only noted while it is within three times of the band', async () => {
    const bench = await BenchUnderTest.open({ expected: EXPECTED });
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto(DIRECT, '14.9');
    expect(bench.panel()).toContain('14.9 V is a little less than what this part can give (15.0 to 18.0 V)');
    await bench.press('Enter', field);
    expect(bench.kept()[0]?.question).toBeNull();
    expect(bench.page.querySelector('[data-column="no_load"]')?.getAttribute('aria-label')).toContain(
      'outside the expected band',
    );
  });

  it('asks nothing where the part has no model', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'ripple');
    await bench.typeInto(SCOPE, '3.7', '0.5', '10');
    expect(bench.panel()).toContain('No rectifier model for this part.');
  });

  it('is asked about again when the server refuses it, and sent with the answer', async () => {
    const bench = await BenchUnderTest.open();
    await bench.focusOn(1, 'no_load');
    const field = await bench.typeInto(DIRECT, '1.72');
    await bench.press('Enter', field);
    const [first] = bench.sent();
    const title = '1.72 V is less than what this part can give.';
    await bench.refuseReading(first, { status: 422, code: 'reading-implausible', title });
    await bench.focusOn(1, 'no_load');
    expect(plain(asked(bench)?.textContent)).toContain('1.72 V is less than what this part can give.');
    pause();
    await bench.press('1', asked(bench) ?? bench.page);
    await bench.press('Enter', asked(bench) ?? bench.page);
    const [again] = bench.sent();
    expect(again?.request.url).toBe(first?.request.url);
    expect(again?.request.body).toMatchObject({ question: { answer: 'confirmed', reason: 'measured-again' } });
  });

  it('of a rack waits for an answer, which is counted, and confirmed with a reason', async () => {
    const sentence = '180 V is more than what this part can give.';
    const question = {
      band: { low: 15, high: 18 },
      sentence,
      given: { answer: 'open' },
      answeredBy: null,
      answeredAt: null,
    } as const;
    const reading = { ...readingOf(2, 'no_load', 180), takenBy: null, rack: 'Rack 2', question };
    const bench = await BenchUnderTest.open({ readings: [reading] });
    expect(plain(bench.page.querySelector('qr-running-verdict')?.textContent)).toContain(
      '1 reading waits for an answer',
    );
    await bench.click('1 reading waits', bench.page.querySelector('qr-running-verdict') ?? bench.page);
    expect(bench.panel()).toContain(sentence);
    expect(bench.panel()).toContain('Rack 2');
    pause();
    await bench.press('2', asked(bench) ?? bench.page);
    await bench.press('Enter', asked(bench) ?? bench.page);
    const answer = bench.http.expectOne(`/api/lots/12/readings/${reading.id}/answer`);
    expect(answer.request.body).toEqual({ reason: 'known-fault', note: '' });
    expect(bench.panel()).toContain('Confirmed by I. Sandvær: the unit is faulty');
  });
});
