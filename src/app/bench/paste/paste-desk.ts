import { inject, Injectable } from '@angular/core';
import { type PastedCell, pastedCells, pastedRows } from '#shared/bench/pasted-cells';
import { type Characteristic } from '#shared/contract/plans';
import { BenchActs } from '../sheet/bench-acts';
import { BenchCursor } from '../sheet/bench-cursor';
import { BenchSheet, type TypedWorth } from '../sheet/bench-sheet';
import { understood } from '../sheet/draft-outcome';
import { InstrumentChoice } from '../sheet/instrument-choice';
import { plausibilityOf } from '../sheet/reading-plausibility';
import { byUnit } from '../sheet/by-unit';
import { countingAt } from '../sheet/unit-record';
import { type Confirmation } from '../waiting/bench-act';
import { type CheckedCell, type CheckedPaste, cellsIn } from './checked-paste';
import { pastedEntry } from './paste-entry';

type Checked = Pick<CheckedCell, 'reading' | 'state' | 'why'>;

const fault = (why: string): Checked => ({ reading: null, state: 'fault', why });

/** Takes readings over from a spreadsheet: lays them onto the grid, checks each as if it were typed, keeps what can be kept. */
@Injectable()
export class PasteDesk {
  private readonly sheet = inject(BenchSheet);
  private readonly acts = inject(BenchActs);
  private readonly cursor = inject(BenchCursor);
  private readonly instruments = inject(InstrumentChoice);

  /** What a pasted text would bring; nothing is kept yet. */
  check(text: string, decimalComma: boolean): CheckedPaste {
    const stops = this.cursor.stops().map(({ characteristic }) => characteristic);
    const { unit, key } = this.cursor.at();
    const from = { unit, column: stops.findIndex((each) => each.key === key) };
    const block = pastedCells(pastedRows(text), { units: this.sheet.records().length, columns: stops, from });
    const rows = [...byUnit(block.cells)].map(([number, cells]) => this.checkUnit(number, cells, decimalComma));
    const used = new Set(block.cells.map((cell) => cell.key));
    return {
      headed: block.headed,
      columns: stops.filter((each) => used.has(each.key)),
      rows,
      outside: block.faults.map(({ row, message }) => (row === null ? message : `Row ${row}: ${message}`)),
      lot: this.sheet.lotWith(rows.map(({ verdict }) => verdict)),
    };
  }

  /** Keeps what can be kept, and with a reason also what was questioned; says how many. */
  keep(checked: CheckedPaste, confirmation: Confirmation | null): number {
    const takenAt = new Date().toISOString();
    const questioned = confirmation === null ? [] : cellsIn(checked, 'question');
    const kept = [...cellsIn(checked, 'good'), ...questioned].sort((one, other) => one.unit - other.unit);
    const bodies = kept.flatMap(({ unit, characteristic, reading, state }) => {
      if (reading === null) return [];
      const question =
        state === 'question' && confirmation ? ({ answer: 'confirmed', ...confirmation } as const) : null;
      const instrumentId = this.instruments.instrumentFor(characteristic)?.id ?? null;
      const { entry, rangeId } = reading;
      return [
        {
          body: {
            unit,
            characteristicKey: characteristic.key,
            entry,
            instrumentId,
            rangeId,
            note: '',
            question,
            repeat: null,
            takenAt,
          },
        },
      ];
    });
    this.acts.keepAll(bodies);
    return bodies.length;
  }

  private checkUnit(unit: number, pasted: readonly PastedCell[], decimalComma: boolean): CheckedPaste['rows'][number] {
    const record = this.sheet.recordOf(unit);
    const cells = new Map<string, CheckedCell>();
    const typed = new Map<string, TypedWorth>();
    for (const { key, text } of pasted) {
      const characteristic = this.characteristic(key);
      const taken = countingAt(record, key) !== undefined || cells.has(key);
      const checked = taken
        ? fault('This cell has a reading already.')
        : this.checkCell(text, characteristic, decimalComma);
      cells.set(key, { unit, characteristic, text, ...checked });
      if (checked.reading !== null) typed.set(key, this.worthOf(characteristic, checked.reading));
    }
    return { unit, cells, verdict: this.sheet.verdictWith(record, typed) };
  }

  private checkCell(text: string, characteristic: Characteristic, decimalComma: boolean): Checked {
    if (characteristic.kind === 'computed') return { reading: null, state: 'skipped', why: 'The program computes it.' };
    const lacking = this.instruments.lackingFor(characteristic);
    if (lacking !== '') return fault(lacking);
    const outcome = this.read(text, characteristic, decimalComma);
    if (outcome.state !== 'read')
      return fault(outcome.state === 'refused' ? outcome.message : 'Nothing is written here.');
    const { entry, value } = outcome;
    const range = typeof value === 'number' ? this.instruments.rangeFor(characteristic, value, entry.kind) : null;
    if (range?.state === 'refused') return fault(range.message);
    if (range?.state === 'none' && this.sheet.budgets().asked)
      return fault('This plan judges with guard bands, and the uncertainty of this is not known.');
    const rangeId = this.instruments.namedFor(characteristic, entry.kind);
    const found = plausibilityOf(characteristic, this.sheet.bench().expected, outcome);
    const questioned = found?.state === 'question';
    return { reading: { entry, value, rangeId }, state: questioned ? 'question' : 'good', why: found?.sentence ?? '' };
  }

  private read(text: string, characteristic: Characteristic, decimalComma: boolean) {
    try {
      return understood(pastedEntry(text, characteristic, decimalComma), characteristic);
    } catch (thrown) {
      if (thrown instanceof RangeError) return { state: 'refused', message: thrown.message } as const;
      throw thrown;
    }
  }

  private worthOf(characteristic: Characteristic, { entry, value }: NonNullable<Checked['reading']>): TypedWorth {
    if (typeof value !== 'number') return { value, budget: undefined };
    const range = this.instruments.rangeFor(characteristic, value, entry.kind);
    const known = range.state === 'chosen' ? range.range : undefined;
    return { value, budget: known && this.sheet.budgets().ofTyped(characteristic, value, entry, known) };
  }

  private characteristic(key: string): Characteristic {
    const found = this.cursor.stops().find(({ characteristic }) => characteristic.key === key);
    if (found === undefined) throw new RangeError(`the plan has no characteristic ${key}.`);
    return found.characteristic;
  }
}
