import { FormControl, FormGroup, type ValidatorFn } from '@angular/forms';
import { type GaugeStudy, type GaugeStudyBody } from '#shared/contract/gauge-studies';
import { reshapedValues } from '#shared/gauge-study/reshaped-values';
import { formatLimits } from '#shared/quantities/format-limits';
import { type FieldsOf } from '../../data/record-form';
import { type Difference } from '../../ui/conflict-note';

type Unit = GaugeStudyBody['unit'];

const text = (value = '') => new FormControl(value, { nonNullable: true });
const quantity = () => new FormControl<number | null>(null);

const chosen: ValidatorFn = ({ value }) => (value === null ? { chosen: 'Choose an instrument.' } : null);

/** The size that is usual: ten parts, three persons, three trials. AIAG MSA, 4th edition. */
const USUAL_PARTS = Array.from({ length: 10 }, (_, nth) => `Part ${String(nth + 1)}`);
const USUAL_TRIALS = 3;

/** Names written one below the other. */
export function namesOf(lines: string): string[] {
  return lines
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
}

/** What a study is about. Its readings are entered on its page; here they only follow its size. */
export class StudyFields implements FieldsOf<GaugeStudy> {
  readonly group = new FormGroup({
    title: text(),
    instrumentId: new FormControl<number | null>(null, chosen),
    quantity: text(),
    unit: new FormControl<Unit>('V', { nonNullable: true }),
    decimals: new FormControl(3, { nonNullable: true }),
    lowerLimit: quantity(),
    upperLimit: quantity(),
    parts: text(USUAL_PARTS.join('\n')),
    persons: text(),
    trials: new FormControl(USUAL_TRIALS, { nonNullable: true }),
    note: text(),
  });
  private before: GaugeStudy | null = null;

  show(study: GaugeStudy): void {
    this.before = study;
    const { title, quantity, unit, decimals, lowerLimit, upperLimit, parts, persons, trials, note } = study;
    this.group.reset({
      ...{ title, quantity, unit, decimals, lowerLimit, upperLimit, trials, note },
      instrumentId: study.instrument.id,
      parts: parts.join('\n'),
      persons: persons.join('\n'),
    });
  }

  /** As it is sent, the readings with the names they were taken of. */
  value() {
    const { parts: partLines, persons: personLines, ...rest } = this.group.getRawValue();
    const plan = { parts: namesOf(partLines), persons: namesOf(personLines), trials: rest.trials };
    const before = this.before ?? { parts: [], persons: [], trials: 0, values: [] };
    return { ...rest, ...plan, values: reshapedValues(before, plan) };
  }

  /** Readings that the new size has no place for. */
  lost(): number {
    const kept = this.value().values.flat(2);
    return (this.before?.entered ?? 0) - kept.filter((value) => value !== null).length;
  }

  /** Goes on from what somebody else saved, with what was typed here. */
  readingsOf(theirs: GaugeStudy): void {
    this.before = theirs;
  }

  differences(theirs: GaugeStudy): Difference[] {
    const mine = this.value();
    const limits = (of: Pick<GaugeStudy, 'lowerLimit' | 'upperLimit' | 'unit' | 'decimals'>) =>
      formatLimits(of.lowerLimit, of.upperLimit, of.unit, of.decimals);
    const rows: Difference[] = [
      { label: 'Study', mine: mine.title, theirs: theirs.title },
      { label: 'Quantity', mine: mine.quantity, theirs: theirs.quantity },
      { label: 'Limits', mine: limits(mine), theirs: limits(theirs) },
      { label: 'Parts', mine: mine.parts.join(', '), theirs: theirs.parts.join(', ') },
      { label: 'Persons', mine: mine.persons.join(', '), theirs: theirs.persons.join(', ') },
      { label: 'Trials', mine: String(mine.trials), theirs: String(theirs.trials) },
      { label: 'Note', mine: mine.note, theirs: theirs.note },
    ];
    return rows.filter((row) => row.mine !== row.theirs);
  }
}
