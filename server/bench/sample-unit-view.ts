import { type Bench } from '#shared/contract/bench';
import { type UnitRows } from '#server/judging/lot-judging';

type SampleUnit = Bench['units'][number];

/** A drawn unit as the contract shows it. */
export function sampleUnitView({ unit }: Pick<UnitRows, 'unit'>, names: ReadonlyMap<number, string>): SampleUnit {
  const { ruling, rulingReason, ruledById, ruledAt } = unit;
  return {
    unit: unit.unit,
    position: unit.position,
    carton: unit.carton,
    setAside: unit.setAsideReason,
    ruling:
      ruling === null || ruledAt === null
        ? null
        : { ruling, reason: rulingReason ?? '', by: names.get(ruledById ?? 0) ?? '', at: ruledAt },
  };
}
