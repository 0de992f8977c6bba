import { type RevisionBody } from '../contract/plans';

/** The content of a plan revision, as its rules see it. */
export type PlanContent = Pick<RevisionBody, 'level' | 'classAqls' | 'characteristics'>;

/** A characteristic whose values have limits. */
export type LimitedCharacteristic = Exclude<PlanContent['characteristics'][number], { kind: 'attribute' }>;

/** A characteristic that is computed from measured ones. */
export type ComputedCharacteristic = Extract<PlanContent['characteristics'][number], { kind: 'computed' }>;
