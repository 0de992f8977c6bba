import { type CertificateData, type CertificateResult } from '#shared/papers/certificate-data';
import { DECISION_RULE_TITLES } from '#shared/contract/plans';
import { DECISION_RULE_MEANINGS } from '#shared/plan/decision-rule-words';
import { formatLimits, formatNumber, formatQuantity, inDisplayUnit } from '#shared/quantities/format-quantity';
import { uncertaintyDigits } from '#shared/quantities/format-uncertainty';
import { rangeText } from './paper-reading';
import { utcDay } from './paper-time';

const NB = '\u00a0';

function unitCount(count: number): string {
  return `${formatNumber(count, 0)}${NB}${count === 1 ? 'unit' : 'units'}`;
}

const given = (...parts: string[]) => parts.filter((part) => part !== '').join(', ');
const labelled = (label: string, value: string) => (value === '' ? '' : `${label}${NB}${value}`);

function lettersOf({ groups }: CertificateData): string {
  const letters = [...new Set(groups.map((group) => group.codeLetter))];
  return `${letters.length > 1 ? 'letters' : 'letter'}${NB}${letters.join(', ')}`;
}

function inspectedOn({ measuredFrom, measuredTo }: CertificateData): string {
  const [first, last] = [utcDay(measuredFrom), utcDay(measuredTo)];
  return first === last ? first : `${first} to ${last}`;
}

/** The warm-up that the plan asks for, and how much of it was over at the first reading. */
function warmUpText(conditions: NonNullable<CertificateData['conditions']>, measuredFrom: string): string {
  const { warmUpMinutes, warmUpStartedAt } = conditions;
  if (warmUpMinutes === null) return '';
  const asked = `${warmUpMinutes}${NB}min`;
  if (warmUpStartedAt === null) return `warm-up of ${asked} asked, its start not noted`;
  const over = Math.floor((Date.parse(measuredFrom) - Date.parse(warmUpStartedAt)) / 60_000);
  if (over >= warmUpMinutes) return `after ${asked} of warm-up`;
  return over < 0
    ? `warm-up of ${asked} begun after the first reading`
    : `from ${over}${NB}min into a warm-up of ${asked}`;
}

/** Room, mains, load, bandwidth and warm-up, as noted last; nothing is said of what was not noted. */
export function conditionsText({ conditions, measuredFrom }: CertificateData): string {
  if (!conditions) return '';
  const { ambientCelsius, mainsVolts, mainsHertz, load, bandwidth, note } = conditions;
  const mains = [
    mainsVolts === null ? '' : formatQuantity(mainsVolts, 'V'),
    mainsHertz === null ? '' : formatQuantity(mainsHertz, 'Hz'),
  ].filter((part) => part !== '');
  return given(
    ambientCelsius === null ? '' : formatQuantity(ambientCelsius, '°C'),
    labelled('mains', mains.join(' ')),
    load,
    bandwidth,
    warmUpText(conditions, measuredFrom),
    note,
  );
}

/** The facts beside the plate, as label and value. */
export function certificateFacts(data: CertificateData): { label: string; value: string }[] {
  const { lot, part, plan } = data;
  return [
    { label: 'Lot', value: lot.number },
    { label: 'Part', value: given(part.number, part.name) },
    { label: 'Supplier', value: given(data.supplier, labelled('delivery', lot.deliveryNumber)) },
    { label: 'Order', value: given(lot.orderNumber, labelled('date code', lot.dateCode)) },
    { label: 'Lot size', value: given(unitCount(lot.size), `arrived${NB}${utcDay(lot.arrivedAt)}`) },
    { label: 'Plan', value: `${plan.number} rev${NB}${plan.revision}` },
    {
      label: 'Sampling',
      value: `Level${NB}${plan.level}, ${lettersOf(data)}, ${plan.severity}, n${NB}=${NB}${formatNumber(data.sampleSize, 0)}`,
    },
    { label: 'Inspected', value: inspectedOn(data) },
    { label: 'Conditions', value: conditionsText(data) },
  ].filter((fact) => fact.value !== '');
}

function releasedUnits({ unitsRemoved, unitsReleased }: CertificateData): string {
  const released = `${unitCount(unitsReleased)} ${unitsReleased === 1 ? 'is' : 'are'} released.`;
  if (unitsRemoved === 0) return `No nonconforming unit was found; ${released}`;
  const removed =
    unitsRemoved === 1 ? 'The nonconforming unit was' : `The ${formatNumber(unitsRemoved, 0)} nonconforming units were`;
  return `${removed} removed from the lot; ${released}`;
}

/** What the certificate states. */
export function statement(data: CertificateData): string {
  const { number, revision } = data.plan;
  return (
    `The lot named above was inspected under plan ${number} rev${NB}${revision}. Nonconforming units are within the ` +
    `acceptance number of every class. ${releasedUnits(data)}`
  );
}

function repeatsTold(repeats: number): string {
  if (repeats === 0) return 'No reading was repeated.';
  const many = repeats === 1 ? '1 reading was' : `${formatNumber(repeats, 0)} readings were`;
  return `${many} repeated; every reading taken is on record, and the last counts.`;
}

/** The rule by its name and what it does; the guard bands with their k. */
function ruleText({ decisionRule, coverageFactor }: CertificateData): string {
  const title = DECISION_RULE_TITLES[decisionRule].toLowerCase();
  const meaning = lowerFirst(DECISION_RULE_MEANINGS[decisionRule]);
  const guard =
    decisionRule === 'simple' ? '' : ` (ILAC-G8:09/2019, guard band w${NB}=${NB}U, k${NB}=${NB}${coverageFactor ?? 2})`;
  return `Decision rule: ${title}${guard}; ${meaning}`;
}

/** What the column U states, and which units quality ruled on. */
function uncertaintyTold({ results, coverageFactor = 2, unitsRuled = 0 }: CertificateData): string {
  const isStated = results.some(({ expandedUncertainty }) => typeof expandedUncertainty === 'number');
  const stated = isStated
    ? ` U is the largest expanded uncertainty of the readings, k${NB}=${NB}${coverageFactor} (JCGM${NB}100).`
    : '';
  if (unitsRuled === 0) return stated;
  const many = unitsRuled === 1 ? '1 undecided unit was' : `${formatNumber(unitsRuled, 0)} undecided units were`;
  return `${stated} ${many} ruled conforming by quality.`;
}

function lowerFirst(sentence: string): string {
  return sentence.charAt(0).toLowerCase() + sentence.slice(1);
}

/** How the readings were judged, what the certificate does not state, and the digest of what it states. */
export function finePrint(data: CertificateData, dataDigest: string): string[] {
  const judged = formatNumber(data.unitsJudged, 0);
  return [
    `${ruleText(data)}${uncertaintyTold(data)} ${repeatsTold(data.repeats)} ` +
      `Sampling: ${data.scheme}, single sampling; ${judged} units judged.`,
    'This states conformity of the sampled lot to the plan, not product-safety approval; local electrical-safety rules ' +
      'take precedence.',
    `Digest of the data stated here (SHA-256): ${dataDigest}`,
  ];
}

export function limitsText(result: CertificateResult): string {
  if (result.kind === 'attribute') return result.requirement ?? '';
  return formatLimits(result.lowerLimit, result.upperLimit, result.unit ?? '', result.decimals);
}

/** Lowest and highest reading; of an attribute whether all passed, and what failed. */
export function findings(result: CertificateResult): string {
  if (result.kind === 'attribute') {
    if (result.found === 0) return 'all pass';
    return given(`${formatNumber(result.found, 0)} fail`, ...new Set(result.failReasons));
  }
  return result.min === null || result.max === null ? 'no reading' : rangeText(result.min, result.max, result);
}

/** The largest U of the readings, in the unit that the range names. */
export function uncertaintyCell({ kind, unit, expandedUncertainty = null }: CertificateResult): string {
  if (kind === 'attribute' || expandedUncertainty === null) return '';
  return `±${NB}${uncertaintyDigits(expandedUncertainty, unit ?? '')}`;
}

/** The mean, in the unit that the range beside it names. */
export function meanText(result: CertificateResult): string {
  if (result.kind === 'attribute' || result.mean === null) return '';
  return formatNumber(inDisplayUnit(result.mean, result.unit ?? ''), result.decimals);
}

/** Name and condition, a number in them not parted from its unit. */
export function resultName({ name, condition }: CertificateResult): string {
  return given(name, condition).replaceAll(/(?<=\d) (?=\p{L}{1,3}(?!\p{L}))/gu, NB);
}
