import { utcMinute } from '#server/documents/paper-time';
import { type Failure } from '#shared/contract/nonconformances';
import { formatNumber } from '#shared/quantities/format-quantity';
import { type NonconformityClass } from '#shared/sampling/scheme';
import { failingCharacteristic } from './failing-characteristic';
import { type RenderedLetter, renderLetter } from './letter';
import { lines, oneLine } from './one-line';

/** What engineering is told when a lot is rejected. */
export interface RejectionNotice {
  siteName: string;
  department: string;
  lot: { number: string; size: number; deliveryNumber: string; orderNumber: string; dateCode: string };
  part: { number: string; name: string };
  supplier: string;
  plan: { number: string; revision: number };
  nonconformance: { number: string; openedAt: string };
  /** The sentence of the verdict. */
  reason: string;
  groups: RejectionGroup[];
  failures: Failure[];
  containment: string;
  signedBy: { name: string; stampNumber: string | null };
  /** Where the nonconformance is read, or null when the site has no public address. */
  link: string | null;
}

interface RejectionGroup {
  class: NonconformityClass;
  found: number;
  acceptance: number;
  rejection: number;
  sampleSize: number;
  aql: string;
}

const REQUESTS = [
  'Say what the failing readings mean for our product, and whether any unit may be used as it is.',
  'Name the likely cause, and whether other lots of this part can have it.',
  'Say which disposition you would agree to: return to supplier, rework, sort, use as is under concession, or scrap.',
];

const capitalised = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

function units(count: number): string {
  return `${formatNumber(count, 0)}\u00a0${count === 1 ? 'unit' : 'units'}`;
}

/** What was not given leaves no empty words behind. */
function joined(...parts: [label: string, value: string][]): string {
  return parts
    .map(([label, value]) => [label, oneLine(value)] as const)
    .filter(([, value]) => value !== '')
    .map(([label, value]) => (label === '' ? value : `${label} ${value}`))
    .join(', ');
}

function groupView(group: RejectionGroup) {
  return { ...group, class: capitalised(group.class), rejected: group.found >= group.rejection };
}

function facts(notice: RejectionNotice) {
  const { lot, part, plan, nonconformance } = notice;
  return [
    { label: 'Part', value: joined(['', part.number], ['', part.name]) },
    { label: 'Supplier', value: oneLine(notice.supplier) },
    {
      label: 'Delivery',
      value: joined(['', lot.deliveryNumber], ['order', lot.orderNumber], ['date code', lot.dateCode]),
    },
    { label: 'Lot size', value: units(lot.size) },
    { label: 'Plan', value: `${oneLine(plan.number)} rev ${plan.revision}` },
    {
      label: 'Nonconformance',
      value: joined(['', nonconformance.number], ['opened', utcMinute(nonconformance.openedAt)]),
    },
  ];
}

/** The numbers, as a mail program shows them beside the subject. */
function preheader(notice: RejectionNotice): string {
  const reached = notice.groups
    .filter((group) => group.found >= group.rejection)
    .map(
      (group) =>
        `${group.found} ${group.class} nonconforming in ${group.sampleSize}, rejection number ${group.rejection}`,
    );
  return [...reached, `${units(notice.lot.size)} on hold`].join('. ') + '.';
}

/** The notice of a rejected lot to the engineering list, as HTML and as plain text in the same order. */
export function rejectionNotice(notice: RejectionNotice): RenderedLetter & { subject: string } {
  const number = oneLine(notice.nonconformance.number);
  const subject = `Lot ${oneLine(notice.lot.number)} rejected [${number}]`;
  const stamp = notice.signedBy.stampNumber;
  const view = {
    subject,
    preheader: preheader(notice),
    siteName: oneLine(notice.siteName),
    department: oneLine(notice.department),
    number,
    verdict: 'REJECTED',
    reached: notice.groups.map(groupView).filter((group) => group.rejected),
    groups: notice.groups.map(groupView),
    reason: oneLine(notice.reason),
    consequence: `The lot of ${units(notice.lot.size)} is on hold until its disposition is agreed.`,
    facts: facts(notice),
    failures: notice.failures.map(failingCharacteristic),
    containment: lines(notice.containment),
    requests: REQUESTS.map((request, nth) => ({ nth: nth + 1, request })),
    link: notice.link,
    signedBy: joined(['', notice.signedBy.name], ['stamp', stamp ?? '']),
    sentAt: utcMinute(notice.nonconformance.openedAt),
  };
  return { subject, ...renderLetter('rejection-notice', view) };
}
