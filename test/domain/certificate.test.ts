import { certificatePdf } from '#server/documents/certificate-pdf';
import {
  certificateFacts,
  conditionsText,
  findings,
  finePrint,
  limitsText,
  meanText,
  resultName,
  statement,
  uncertaintyCell,
} from '#server/documents/certificate-words';
import { FontRuns } from '#server/documents/font-runs';
import { STYLES } from '#server/documents/text-style';
import PDFDocument from 'pdfkit';
import { describe, expect, it } from 'vitest';
import { attribute, certificate, measured } from './certificate-sample';

const DIGEST = '9f3a71c2e05d44b8'.repeat(4);
const plain = (text: string) => text.replaceAll(/\s/gu, ' ');

async function file(more: Parameters<typeof certificate>[0] = {}): Promise<string> {
  return (await certificatePdf(certificate(more), DIGEST)).toString('latin1');
}
const count = (text: string, pattern: RegExp) => text.match(pattern)?.length ?? 0;
const pages = (pdf: string) => count(pdf, /\/Type \/Page\b/g);

describe('the certificate as a file', () => {
  it('is a tagged PDF 1.7 with a language and a title to show', async () => {
    const pdf = await file();
    expect(pdf).toMatch(/^%PDF-1\.7/);
    expect(pdf).toContain('/StructTreeRoot');
    expect(pdf).toMatch(/\/Lang \(en\)/);
    expect(pdf).toContain('/Marked true');
    expect(pdf).toContain('/DisplayDocTitle true');
    expect(pdf).toContain('Certificate of conformance CC-26-0187');
    for (const element of ['Document', 'H1', 'H2', 'P', 'Table', 'TR', 'TH', 'TD'])
      expect(pdf, element).toMatch(new RegExp(`/S /${element}\\b`));
  });

  it('embeds every font it uses', async () => {
    const pdf = await file();
    const used = count(pdf, /\/Type \/FontDescriptor/g);
    expect(used).toBeGreaterThanOrEqual(5);
    expect(count(pdf, /\/FontFile2 \d/g)).toBe(used);
    expect(count(pdf, /\/ToUnicode \d/g)).toBe(used);
  });

  it('has the same bytes for the same data, and others for other data', async () => {
    expect(await file()).toBe(await file());
    expect(await file({ supplier: 'Baltree Electronics' })).not.toBe(await file());
  });

  it('fits one page for eight characteristics', async () => {
    expect(pages(await file({ results: Array.from({ length: 8 }, () => measured()) }))).toBe(1);
  });

  it('goes over pages for forty characteristics and sixty instruments', async () => {
    const results = Array.from({ length: 40 }, (_, nth) => measured({ name: `Ripple ${nth}` }));
    const instruments = Array.from({ length: 60 }, (_, nth) => ({
      assetNumber: `OS-${nth}`,
      kind: 'Oscilloscope',
      calibrationDue: '2026-09-30',
    }));
    expect(pages(await file({ results }))).toBe(2);
    expect(pages(await file({ results, instruments }))).toBe(4);
  });

  it('takes names of two hundred characters and of other scripts', async () => {
    const supplier = 'Łódź κόσμος Электро 日本 '.repeat(10).slice(0, 200);
    const part = { number: 'N'.repeat(40), name: 'Ü'.repeat(200) };
    expect(pages(await file({ supplier, part }))).toBe(2);
  });
});

describe('the fonts of a certificate', () => {
  const shown = (text: string, style = STYLES.text) =>
    new FontRuns(new PDFDocument({ autoFirstPage: false }))
      .split(text, style)
      .map((run) => run.text)
      .join('');

  it.each(['text', 'reading', 'identifier'] as const)('have a glyph for every sign of the trade in %s', (style) => {
    const signs = 'Ω µ ± − ≤ ≥ × ÷ ° Δ “” … · ²';
    expect(shown(signs, STYLES[style])).toBe(signs);
  });

  it('show the narrow no-break space as a thin space', () => {
    expect(shown('1\u202f200')).toBe('1\u2009200');
  });

  it('read the ohm sign as omega, and join accents to their letters', () => {
    expect(shown('\u2126 e\u0301')).toBe('\u03a9 \u00e9');
  });

  it('show a mark for a character they do not have', () => {
    expect(shown('a日b')).toBe('a\ufffdb');
  });
});

describe('the words of a certificate', () => {
  it('state the conformity of the lot and how many units are released', () => {
    expect(plain(statement(certificate()))).toBe(
      'The lot named above was inspected under plan P-014 rev 4. Nonconforming units are within the acceptance number ' +
        'of every class. The 3 nonconforming units were removed from the lot; 1 197 units are released.',
    );
  });

  it.each([
    [0, 1200, 'No nonconforming unit was found; 1 200 units are released.'],
    [1, 1199, 'The nonconforming unit was removed from the lot; 1 199 units are released.'],
    [2, 1, 'The 2 nonconforming units were removed from the lot; 1 unit is released.'],
  ])('tell of %i removed and %i released', (unitsRemoved, unitsReleased, sentence) => {
    expect(plain(statement(certificate({ unitsRemoved, unitsReleased })))).toContain(sentence);
  });

  it('name the scheme and its tables, and claim no safety approval', () => {
    const print = plain(finePrint(certificate(), DIGEST).join(' '));
    expect(print).toContain('ANSI/ASQ Z1.4 (tables of MIL-STD-105E)');
    expect(print).toContain('simple acceptance');
    expect(print).toContain('2 readings were repeated');
    expect(print).toContain('not product-safety approval; local electrical-safety rules take precedence');
    expect(print).toContain(DIGEST);
    expect(print).not.toMatch(/17050|ISO/);
  });

  it.each([
    ['guarded', 'guarded acceptance (ILAC-G8:09/2019, guard band w = U, k = 1.65); each limit is drawn in by U'],
    [
      'non-binary',
      'guard band on both sides (ILAC-G8:09/2019, guard band w = U, k = 1.65); a guard band of U lies on both',
    ],
  ] as const)('state the decision rule %s in words, with its k', (decisionRule, words) => {
    const [judged = ''] = finePrint(certificate({ decisionRule, coverageFactor: 1.65 }), DIGEST);
    expect(plain(judged)).toContain(`Decision rule: ${words}`);
    expect(judged).not.toContain('simple');
  });

  it('state the largest uncertainty in the unit of the range, and what it is', () => {
    const ripple = measured({ unit: 'mV p-p', expandedUncertainty: 0.0061 });
    expect(plain(uncertaintyCell(ripple))).toBe('± 6');
    expect(uncertaintyCell(measured())).toBe('');
    expect(uncertaintyCell(attribute({ expandedUncertainty: null }))).toBe('');
    const told = plain(
      finePrint(certificate({ results: [ripple], coverageFactor: 2, unitsRuled: 1 }), DIGEST).join(' '),
    );
    expect(told).toContain('U is the largest expanded uncertainty of the readings, k = 2 (JCGM 100).');
    expect(told).toContain('1 undecided unit was ruled conforming by quality.');
    expect(finePrint(certificate(), DIGEST).join(' ')).not.toContain('expanded uncertainty');
  });

  it('state what the lot was measured under, and nothing that was not noted', () => {
    const noted = {
      ambientCelsius: 23,
      mainsVolts: 230,
      mainsHertz: 50,
      load: 'electronic load',
      bandwidth: '20 MHz',
      note: '',
      warmUpMinutes: 15,
      warmUpStartedAt: '2026-03-17T08:40:00.000Z',
    };
    const words = (more: Partial<typeof noted>) =>
      plain(conditionsText(certificate({ conditions: { ...noted, ...more } })));
    expect(words({})).toBe('23 °C, mains 230 V 50 Hz, electronic load, 20 MHz, after 15 min of warm-up');
    expect(words({ warmUpStartedAt: '2026-03-17T08:55:00.000Z' })).toContain('from 5 min into a warm-up of 15 min');
    expect(words({ warmUpStartedAt: '2026-03-17T09:30:00.000Z' })).toContain('begun after the first reading');
    expect(conditionsText(certificate())).toBe('');
    expect(certificateFacts(certificate()).map(({ label }) => label)).not.toContain('Conditions');
  });

  it('leave out an order and a date code that were not given', () => {
    const bare = certificate({ lot: { ...certificate().lot, orderNumber: '', dateCode: '' } });
    expect(certificateFacts(bare).map((fact) => fact.label)).not.toContain('Order');
  });

  it('name the day once when a lot was inspected within it', () => {
    const facts = certificateFacts(certificate({ measuredFrom: '2026-03-18T09:00:00.000Z' }));
    expect(facts.find((fact) => fact.label === 'Inspected')?.value).toBe('2026-03-18');
  });

  it('give limits, range and mean in the unit of the characteristic', () => {
    const insulation = measured({
      unit: 'MΩ',
      decimals: 0,
      lowerLimit: 100e6,
      upperLimit: null,
      min: 480e6,
      mean: 1112e6,
      max: 1960e6,
    });
    expect(plain(limitsText(insulation))).toBe('min 100 MΩ');
    expect(plain(findings(insulation))).toBe('480 to 1 960 MΩ');
    expect(plain(meanText(insulation))).toBe('1 112');
    expect(plain(findings(measured({ min: 1.579, max: 1.581 })))).toBe('1.58 V p-p');
  });

  it('tell what failed on an attribute, each reason once', () => {
    expect(findings(attribute())).toBe('all pass');
    expect(findings(attribute({ found: 3, failReasons: ['Smeared', 'Dented', 'Smeared'] }))).toBe(
      '3 fail, Smeared, Dented',
    );
    expect(limitsText(attribute())).toBe('Legible, complete');
  });

  it('keep a number of the condition with its unit', () => {
    expect(resultName(measured())).toBe('Ripple, at 500\u00a0mA');
  });
});
