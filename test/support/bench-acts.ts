import { type Lot } from '#shared/contract/lots';
import { type Characteristic, type RevisionBody } from '#shared/contract/plans';
import { type Role } from '#shared/contract/roles';
import { randomUUID } from 'node:crypto';
import { type TestSite } from './test-site';
import { SIMPLE_RULES } from './plan-bodies';

/** A plan at level II with the usual AQLs of each class. */
export function planOf(...characteristics: Characteristic[]): RevisionBody {
  const classAqls: RevisionBody['classAqls'] = [
    { class: 'critical', aql: '0.65' },
    { class: 'major', aql: '1.0' },
    { class: 'minor', aql: '2.5' },
  ];
  return { level: 'II', classAqls, characteristics, ...SIMPLE_RULES, changeNote: '' };
}

/** A reading as the inspector types it. */
export function typedReading(unit: number, characteristicKey: string, text: string, more: object = {}) {
  return {
    unit,
    characteristicKey,
    entry: { kind: 'direct', text, decimalComma: false },
    instrumentId: null,
    note: '',
    repeat: null,
    takenAt: '2026-03-12T08:00:00.000Z',
    ...more,
  };
}

/** Sends a reading for a lot at the bench; the caller says what must come of it. */
export function keep(
  site: TestSite,
  lot: Pick<Lot, 'id'>,
  reading: object,
  { id = randomUUID() as string, who = 'inspector' as Role } = {},
) {
  return site.as(who).put(`/api/lots/${lot.id}/readings/${id}`).send(reading);
}

export function submit(site: TestSite, lot: Pick<Lot, 'id' | 'version'>) {
  return site.as('inspector').post(`/api/lots/${lot.id}/submission`).set('if-match', `"${lot.version}"`);
}

export async function lotNow(site: TestSite, { id }: Pick<Lot, 'id'>): Promise<Lot> {
  return (await site.as('quality').get(`/api/lots/${id}`).expect(200)).body as Lot;
}
