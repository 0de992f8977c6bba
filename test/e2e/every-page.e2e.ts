import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { type Page } from '@playwright/test';
import type Axe from 'axe-core';
import { settling } from './support/settling';
import { demoPlaces } from './support/demo-places';
import { expect, test } from './support/site';

const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core'), 'utf8');

const LOT_PAGES = [
  '/arrivals',
  '/arrivals/{arrived}',
  '/released',
  '/on-hold',
  '/lots/{rejected}',
  '/lots/{released}',
  '/lots/{released}/pull-list',
];
const RECORD_PAGES = ['/parts', '/parts/1', '/suppliers', '/suppliers/1', '/account', '/no-such-page'];
const QUALITY_RECORDS = [
  '/plans',
  '/plans/1',
  '/instruments',
  '/instruments/1',
  '/certificates',
  '/certificates/{certificate}',
  '/nonconformances',
  '/nonconformances/{nonconformance}',
];

/** Who may see which pages of the demo, and some of those that are closed to them. */
const PEOPLE: Record<string, { sees: readonly string[]; closed: readonly string[] }> = {
  receiving: {
    sees: [...LOT_PAGES, '/arrivals/new', '/arrivals/{arrived}/correct', ...RECORD_PAGES, '/suppliers/new', '/plans'],
    closed: [
      ...['/bench', '/decision', '/trends', '/people', '/mail', '/site', '/parts/new'],
      '/lots/{released}/units/1/budgets/v_loaded',
    ],
  },
  inspector: {
    sees: [
      '/arrivals',
      '/arrivals/{arrived}',
      '/bench',
      '/bench/{measuring}',
      '/bench/{drawn}',
      '/bench/{measuring}/rack-file',
      '/waveforms/{waveform}',
      '/lots/{measuring}',
      '/lots/{measuring}/units/1/budgets/ripple_pp',
      '/trends',
      '/plans/1',
    ],
    closed: ['/people', '/arrivals/new', '/site', '/suppliers/new', '/racks'],
  },
  quality: {
    sees: [
      '/decision',
      '/decision/{submitted}',
      '/decision/{submitted-last}',
      '/trends',
      '/bench/{measuring}',
      '/lots/{submitted}',
      '/parts/1',
      '/plans/5',
      '/parts/new',
      '/suppliers/new',
      '/plans/new',
    ],
    closed: ['/people', '/mail', '/site'],
  },
  quality2: {
    sees: [
      ...QUALITY_RECORDS,
      '/instruments/new',
      '/instruments/1/facts',
      '/instruments/1/calibrations/new',
      '/reviews',
      '/reviews/{review}',
      '/gauge-studies',
      '/gauge-studies/{study}',
      '/gauge-studies/new',
    ],
    closed: ['/racks/new'],
  },
  engineering: {
    sees: [
      '/on-hold',
      '/lots/{held}',
      '/trends',
      '/plans/1',
      '/parts/1',
      '/nonconformances/{nonconformance}',
      '/bench',
      '/audit',
    ],
    closed: ['/people', '/bench/{measuring}/rack-file', '/plans/new', '/mail'],
  },
  auditor: {
    sees: [
      '/audit',
      '/people',
      '/people/1',
      '/mail',
      '/mail/1',
      '/mail/received/1',
      '/decision',
      '/site',
      '/racks/1',
      '/lots/{submitted}/units/1/budgets/regulation',
    ],
    closed: ['/people/new', '/instruments/new', '/racks/new'],
  },
  admin: {
    sees: [
      '/people',
      '/people/2',
      '/people/new',
      '/mail',
      '/mail/2',
      '/site',
      '/account',
      '/parts',
      '/racks',
      '/racks/1',
      '/racks/new',
    ],
    closed: ['/arrivals', '/bench', '/lots/{rejected}', '/decision', '/trends', '/plans'],
  },
};

/** Colours do not move anything and width does not colour it, so a desk in the one and a phone in the other show all. */
const SCREENS = [
  { width: 1440, height: 900, colorScheme: 'light', readable: true },
  { width: 1440, height: 900, colorScheme: 'dark', readable: false },
  { width: 390, height: 844, colorScheme: 'dark', readable: true },
  { width: 390, height: 844, colorScheme: 'light', readable: false },
] as const;

/** Colours that are still changing from one scheme to the other would be measured half way. */
async function movementEnds(): Promise<void> {
  await new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done)));
  await Promise.allSettled(document.getAnimations().map((animation) => animation.finished));
}

/** What stands wrong on the page. */
async function misplaced(page: Page): Promise<string[]> {
  const headings = await page.locator('h1').count();
  const beyond = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  return [
    ...(headings === 1 ? [] : [`${headings} main headings`]),
    ...(beyond > 0 ? [`${beyond} px wider than the screen`] : []),
  ];
}

/** What somebody cannot read or reach on the page. */
function unreadable(page: Page): Promise<string[]> {
  return page.evaluate(async () => {
    const found = await (globalThis as unknown as { axe: typeof Axe }).axe.run(document, {
      resultTypes: ['violations'],
    });
    return found.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => String(target)).join(', ')}`);
  });
}

/** What is wrong with the page in both colour schemes, on a desk and on a phone. */
async function faultsOnScreens(page: Page, path: string): Promise<string[]> {
  const faults: string[] = [];
  await page.evaluate(axe);
  for (const { width, height, colorScheme, readable } of SCREENS) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await page.setViewportSize({ width, height });
    await page.evaluate(movementEnds);
    const found = [...(await misplaced(page)), ...(readable ? await unreadable(page) : [])];
    faults.push(...found.map((fault) => `${path} at ${width}, ${colorScheme}: ${fault}`));
  }
  return faults;
}

test.describe.configure({ mode: 'parallel' });

/** So many pages are looked at in one test: each is seen on four screens, and slow machines need their time. */
const PAGES_AT_ONCE = 5;

function portionsOf(pages: readonly string[]): string[][] {
  const count = Math.ceil(pages.length / PAGES_AT_ONCE);
  return Array.from({ length: count }, (_, at) => pages.slice(at * PAGES_AT_ONCE, (at + 1) * PAGES_AT_ONCE));
}

for (const [who, { sees, closed }] of Object.entries(PEOPLE)) {
  portionsOf(sees).forEach((pages, at, { length }) => {
    test(`every page of ${who} has one heading, fits the screen and can be read by everybody, ${at + 1} of ${length}`, async ({
      pageOf,
      api,
    }) => {
      const placeOf = await demoPlaces(await api('quality'));
      const page = await pageOf(who);
      const shown = settling(page);
      const faults: string[] = [];
      for (const path of pages.map(placeOf)) {
        await page.setViewportSize(SCREENS[0]);
        await page.goto(path);
        await shown();
        await expect(page.getByText('is open to:'), path).toHaveCount(0);
        await expect(page.getByText(/did not load/), path).toHaveCount(0);
        faults.push(...(await faultsOnScreens(page, path)));
      }
      expect(faults).toEqual([]);
    });
  });

  test(`pages closed to ${who} say who may open them`, async ({ pageOf, api }) => {
    const placeOf = await demoPlaces(await api('quality'));
    const page = await pageOf(who);
    const shown = settling(page);
    for (const path of closed.map(placeOf)) {
      await page.goto(path);
      await shown();
      await expect(page.getByRole('heading', { level: 1 }), path).toBeVisible();
      await expect(page.getByText(/is open to: \w+/), path).toBeVisible();
    }
    expect(await faultsOnScreens(page, page.url())).toEqual([]);
  });
}
