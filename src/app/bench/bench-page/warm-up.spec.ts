import { type NotedConditions } from '#shared/contract/conditions';
import { readingOf } from '../testing/bench-reply';
import { BenchUnderTest } from '../testing/bench-under-test';

const MINUTE = 60_000;

function conditions(warmUpStartedAt: Date | null): NotedConditions {
  return {
    ambientCelsius: 23,
    mainsVolts: 230,
    mainsHertz: 50,
    load: '',
    bandwidth: '',
    warmUpStartedAt: warmUpStartedAt?.toISOString() ?? null,
    note: '',
    notedAt: '2026-03-12T14:00:00.000Z',
    notedBy: 'P. Lindqvar',
  };
}

const ago = (minutes: number) => new Date(Date.now() - minutes * MINUTE);

describe('the conditions of a lot', () => {
  beforeEach(() => localStorage.clear());

  it('stand in the head of the bench', async () => {
    const bench = await BenchUnderTest.open({ conditions: conditions(null) });
    expect(bench.page.querySelector('qr-conditions-fact')?.textContent).toMatch(/23\s°C, 230\sV, 50\sHz/);
  });

  it('are noted with C', async () => {
    const bench = await BenchUnderTest.open();
    await bench.press('c');
    const dialog = await bench.dialog('qr-conditions-dialog');
    const ambient = dialog.querySelector('input');
    if (ambient) ambient.value = '23.5';
    ambient?.dispatchEvent(new Event('input'));
    dialog.querySelector<HTMLButtonElement>('button[type=submit]')?.click();
    const noted = bench.http.expectOne('/api/lots/12/conditions');
    expect(noted.request.body).toMatchObject({ ambientCelsius: 23.5, mainsVolts: null, warmUpStartedAt: null });
    noted.flush({ ...conditions(null), ambientCelsius: 23.5 });
    await vi.waitFor(() => expect(document.querySelector('qr-conditions-dialog')).toBeNull());
    expect(bench.page.querySelector('qr-conditions-fact')?.textContent).toMatch(/23\.5\s°C/);
  });

  it('say that the warm-up is not started, and start it', async () => {
    const bench = await BenchUnderTest.open({ warmUpMinutes: 10 });
    await bench.focusOn(1, 'no_load');
    expect(bench.panel()).toContain('The plan asks for 10 minutes of warm-up; it is not started.');
    await bench.click('Start it');
    const noted = bench.http.expectOne('/api/lots/12/conditions');
    const { warmUpStartedAt } = noted.request.body as { warmUpStartedAt: string };
    expect(Math.abs(Date.parse(warmUpStartedAt) - Date.now())).toBeLessThan(MINUTE);
    noted.flush(conditions(new Date(warmUpStartedAt)));
    await bench.fixture.whenStable();
    expect(bench.page.querySelector('qr-conditions-fact')?.textContent).toMatch(/Warm-up (10:00|9:5\d) left/);
    expect(bench.panel()).toContain('The warm-up lasts until');
  });

  it('let the warm-up count down, whoever started it, and end', async () => {
    const nearlyOver = new Date(Date.now() - 10 * MINUTE + 1200);
    const bench = await BenchUnderTest.open({ warmUpMinutes: 10, conditions: conditions(nearlyOver) });
    expect(bench.page.querySelector('qr-conditions-fact')?.textContent).toMatch(/Warm-up 0:0[12] left/);
    await vi.waitFor(
      () => expect(bench.page.querySelector('qr-conditions-fact')?.textContent).toContain('Warmed up'),
      3500,
    );
    const aloud = () => document.querySelector('.cdk-live-announcer-element')?.textContent;
    await vi.waitFor(() => expect(aloud()).toContain('The warm-up is over.'));
  });

  it('mark readings that were taken before the end of the warm-up', async () => {
    const early = { ...readingOf(1, 'no_load', 17.1), takenAt: ago(15).toISOString() };
    const warm = { ...readingOf(2, 'no_load', 17.1), takenAt: ago(5).toISOString() };
    const bench = await BenchUnderTest.open({
      warmUpMinutes: 10,
      conditions: conditions(ago(20)),
      readings: [early, warm],
    });
    await bench.focusOn(1, 'no_load');
    expect(bench.panel()).toContain('before the end of the warm-up');
    await bench.focusOn(2, 'no_load');
    expect(bench.panel()).not.toContain('before the end of the warm-up');
  });
});
