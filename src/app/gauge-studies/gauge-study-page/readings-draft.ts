import { computed, signal } from '@angular/core';
import { type GaugeStudy, type GaugeStudyBody } from '#shared/contract/gauge-studies';
import { cellName, type PlacedText, type StudyCell } from '#shared/gauge-study/study-cell';
import { inDisplayUnit } from '#shared/quantities/display-unit';
import { readingReader } from '#shared/quantities/parse-reading';
import { DECIMAL_COMMA } from '../../ui/values/decimal-comma';

type Texts = readonly (readonly (readonly string[])[])[];

/** What stands in a cell: a reading in SI base units, nothing, or what nobody can read. */
interface ReadCell {
  value: number | null;
  fault: string | null;
}

/** A cell that cannot be read, by its name. */
export interface CellFault {
  cell: StudyCell;
  name: string;
  message: string;
}

/**
 * A value as its cell shows it: in the study's unit, with its decimals unless the value has more of them, and with the
 * decimal sign of this browser.
 */
export function cellText(value: number | null, { unit, decimals }: Pick<GaugeStudy, 'unit' | 'decimals'>): string {
  if (value === null) return '';
  const shown = inDisplayUnit(value, unit);
  const fixed = shown.toFixed(decimals);
  const text = Number(fixed) === shown ? fixed : String(shown);
  return DECIMAL_COMMA ? text.replace('.', ',') : text;
}

function textsOf(study: GaugeStudy): Texts {
  return study.values.map((rows) => rows.map((cell) => cell.map((value) => cellText(value, study))));
}

/** The readings of a study as they are typed, until they are saved. What cannot be read stays as it was typed. */
export class ReadingsDraft {
  private readonly saved: Texts;
  readonly texts: ReturnType<typeof signal<Texts>>;

  readonly cells = computed(() => {
    const reader = readingReader(this.study.unit);
    return this.texts().map((rows) => rows.map((cell) => cell.map((text) => readCell(text, reader))));
  });
  readonly faults = computed(() => this.cells().flatMap((rows, part) => this.faultsOf(rows, part)));
  readonly entered = computed(
    () =>
      this.cells()
        .flat(2)
        .filter((cell) => cell.value !== null).length,
  );
  readonly changed = computed(() => differing(this.saved, this.texts()).length > 0);

  constructor(readonly study: GaugeStudy) {
    this.saved = textsOf(study);
    this.texts = signal(this.saved);
  }

  /** What stands in a cell as it was typed. */
  textAt({ part, person, trial }: StudyCell): string {
    return this.texts()[part]?.[person]?.[trial] ?? '';
  }

  type(cell: StudyCell, text: string): void {
    this.place([{ cell, text }]);
  }

  /** Sets many cells at once; yields what stood in them before. */
  place(placed: readonly PlacedText[]): PlacedText[] {
    const before = placed.map(({ cell }) => ({ cell, text: this.textAt(cell) }));
    const next = this.texts().map((rows) => rows.map((cell) => [...cell]));
    for (const { cell, text } of placed) {
      const trials = next[cell.part]?.[cell.person];
      if (trials && cell.trial < trials.length) trials[cell.trial] = text;
    }
    this.texts.set(next);
    return before;
  }

  /** What is typed, in SI base units; null where nothing is. */
  values(): GaugeStudyBody['values'] {
    return this.cells().map((rows) => rows.map((cell) => cell.map(({ value }) => value)));
  }

  /** The cells that were typed in since the study was read, as they stand. */
  typed(): PlacedText[] {
    return differing(this.saved, this.texts()).map((cell) => ({ cell, text: this.textAt(cell) }));
  }

  private faultsOf(rows: readonly (readonly ReadCell[])[], part: number): CellFault[] {
    return rows.flatMap((cells, person) =>
      cells.flatMap(({ fault }, trial) => {
        const cell = { part, person, trial };
        return fault === null ? [] : [{ cell, name: cellName(this.study, cell), message: fault }];
      }),
    );
  }
}

function readCell(text: string, reader: ReturnType<typeof readingReader>): ReadCell {
  if (text.trim() === '') return { value: null, fault: null };
  try {
    return { value: reader(text, { decimalComma: DECIMAL_COMMA }), fault: null };
  } catch (thrown) {
    if (!(thrown instanceof RangeError)) throw thrown;
    return { value: null, fault: thrown.message };
  }
}

function differing(before: Texts, now: Texts): StudyCell[] {
  return now.flatMap((rows, part) =>
    rows.flatMap((cells, person) =>
      cells.flatMap((text, trial) => (text === before[part]?.[person]?.[trial] ? [] : [{ part, person, trial }])),
    ),
  );
}
