import { countingReadings } from '#server/judging/lot-judging';
import { type JudgedLot } from '#server/judging/sample-judging';
import { type Failure } from '#shared/contract/nonconformances';

/** What failed in a judged lot: each characteristic with the readings concerned. SI base units. */
export function failuresOf({ rules, units, verdict }: JudgedLot): Failure[] {
  return rules.characteristics.flatMap(({ id, content }) => {
    const failing = verdict.units.filter(({ failed }) => failed.includes(content.key));
    if (failing.length === 0) return [];
    const measured = content.kind === 'attribute' ? null : content;
    const readings = failing.map(({ unit, characteristics }) => {
      const rows = units.find((one) => one.unit.unit === unit);
      const row = rows && countingReadings(rows.readings).get(id);
      const value = characteristics.get(content.key)?.value;
      const reason =
        row?.entry?.kind === 'attribute' && row.entry.reason !== ''
          ? row.entry.reason
          : (rows?.unit.setAsideReason ?? null);
      return { unit, value: typeof value === 'number' ? value : null, reason, attempt: row?.attempt ?? 1 };
    });
    return [
      {
        characteristicKey: content.key,
        name: content.name,
        class: content.class,
        unit: measured?.unit ?? null,
        decimals: measured?.decimals ?? 0,
        lowerLimit: measured?.lowerLimit ?? null,
        upperLimit: measured?.upperLimit ?? null,
        requirement: content.kind === 'attribute' ? content.requirement : null,
        readings,
      },
    ];
  });
}
