import { type Db } from '#db/open-database';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type Caller } from '#server/caller';
import { conditionsOf } from '#server/bench/lot-conditions';
import { instrumentsUsed, readingsThatCount, repeatsOf } from '#server/judging/counting';
import { uncertainResults } from '#server/judging/largest-uncertainty';
import { fixedSampling } from '#server/lots/lot-sampling-queries';
import { signerOf } from '#server/lots/lot-queries';
import { findLot, type LotRow } from '#server/lots/lot-rows';
import { findSite } from '#server/site/site-queries';
import { type LotConditions } from '#shared/contract/conditions';
import { type CertificateData, type CertificateResult } from '#shared/papers/certificate-data';
import { SCHEME_NAME, SCHEME_TABLES } from '#shared/sampling/scheme';

/** The lot to be certified, as it was judged, and who releases it. */
export interface Release {
  lot: LotRow;
  judged: JudgedLot;
  caller: Caller;
  at: Date;
  unitsReleased: number;
}

const NOTHING_NOTED: LotConditions = {
  ambientCelsius: null,
  mainsVolts: null,
  mainsHertz: null,
  load: '',
  bandwidth: '',
  warmUpStartedAt: null,
  note: '',
};

function resultOf(result: ReturnType<typeof uncertainResults>[number]): CertificateResult {
  const { characteristic, n, found, min, mean, max, expandedUncertainty, failReasons, acceptance, rejection } = result;
  const { name, condition, class: nonconformityClass, kind } = characteristic;
  const measured = characteristic.kind === 'attribute' ? null : characteristic;
  return {
    name,
    condition,
    class: nonconformityClass,
    kind,
    unit: measured?.unit ?? null,
    decimals: measured?.decimals ?? 0,
    lowerLimit: measured?.lowerLimit ?? null,
    upperLimit: measured?.upperLimit ?? null,
    requirement: characteristic.kind === 'attribute' ? characteristic.requirement : null,
    n,
    found,
    min,
    mean,
    max,
    expandedUncertainty,
    failReasons,
    acceptance,
    rejection,
  };
}

/** What was noted last of the conditions; null where nothing was noted and the plan asks for no warm-up. */
function conditionsFor(db: Db, lotId: number, { rules }: JudgedLot): CertificateData['conditions'] {
  const { warmUpMinutes } = rules.revision;
  const noted = conditionsOf(db, lotId);
  if (noted === null) return warmUpMinutes === null ? null : { ...NOTHING_NOTED, warmUpMinutes };
  const { ambientCelsius, mainsVolts, mainsHertz, load, bandwidth, warmUpStartedAt, note } = noted;
  return { ambientCelsius, mainsVolts, mainsHertz, load, bandwidth, warmUpStartedAt, note, warmUpMinutes };
}

function groupsOf({ verdict }: JudgedLot): CertificateData['groups'] {
  return verdict.groups.map(({ group, found }) => ({
    class: group.class,
    level: group.level,
    aql: group.aql,
    codeLetter: group.codeLetter,
    sampleSize: group.sampleSize,
    acceptance: group.acceptance,
    rejection: group.rejection,
    found,
  }));
}

function signatures(db: Db, { lot, caller, at }: Release): Pick<CertificateData, 'inspector' | 'quality'> {
  const inspector = signerOf(db, lot.submittedById);
  if (!inspector || lot.submittedAt === null) throw new Error(`Lot ${lot.number} was submitted by nobody.`);
  const { name, stampNumber } = caller;
  return {
    inspector: { ...inspector, title: 'Inspector', signedAt: lot.submittedAt },
    quality: { name, stampNumber, title: 'Quality engineer', signedAt: at.toISOString() },
  };
}

/** All that a certificate states of a lot, gathered at its release. */
export function certificateData(db: Db, number: string, release: Release): CertificateData {
  const { lot, judged, at, unitsReleased } = release;
  const { part, supplier } = findLot(db, lot.id);
  const sampling = fixedSampling(db, lot);
  if (!sampling) throw new Error(`Lot ${lot.number} cannot be certified: its sample was never drawn.`);
  const issuer = findSite(db);
  const counting = readingsThatCount(judged);
  const times = counting.map(({ takenAt }) => takenAt).sort();
  return {
    number,
    issuer: { name: issuer.name, department: issuer.department, address: issuer.address },
    lot: {
      number: lot.number,
      size: lot.countedQuantity,
      deliveryNumber: lot.deliveryNumber,
      orderNumber: lot.orderNumber,
      dateCode: lot.dateCode,
      arrivedAt: lot.arrivedAt,
    },
    part: { number: part.number, name: part.name },
    supplier: supplier.name,
    plan: {
      number: sampling.planNumber,
      revision: sampling.revision,
      level: sampling.level,
      severity: sampling.severity,
    },
    scheme: `${SCHEME_NAME} (${SCHEME_TABLES})`,
    sampleSize: sampling.sampleSize,
    unitsJudged: lot.unitsJudged,
    groups: groupsOf(judged),
    results: uncertainResults(db, judged).map(resultOf),
    decisionRule: judged.rules.revision.decisionRule,
    coverageFactor: judged.rules.revision.coverageFactor,
    conditions: conditionsFor(db, lot.id, judged),
    unitsRuled: judged.units.filter(({ unit }) => unit.ruling === 'conforming').length,
    repeats: repeatsOf(judged),
    unitsRemoved: lot.countedQuantity - unitsReleased,
    unitsReleased,
    instruments: instrumentsUsed(db, counting).map(({ assetNumber, kind, calibrationDue }) => ({
      assetNumber,
      kind,
      calibrationDue,
    })),
    measuredFrom: times[0] ?? at.toISOString(),
    measuredTo: times.at(-1) ?? at.toISOString(),
    ...signatures(db, release),
    issuedAt: at.toISOString(),
  };
}
