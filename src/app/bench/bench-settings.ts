import { Injectable, signal, type WritableSignal } from '@angular/core';
import { INSTRUMENT_KINDS, type InstrumentKind } from '#shared/contract/instruments';
import { WALK_ORDERS, type WalkOrder } from '#shared/bench/grid-walk';
import { DECIMAL_COMMA } from '../ui/values/decimal-comma';

const KEY = 'quietrail.bench';

interface Remembered {
  order: WalkOrder;
  letters: boolean;
  instruments: Partial<Record<InstrumentKind, number>>;
  ranges: Record<string, number>;
  /** Settings of the scope reader that stay from reading to reading. */
  scope: Record<string, string>;
}

/** How this bench is worked at, remembered in this browser. */
@Injectable({ providedIn: 'root' })
export class BenchSettings {
  private readonly stored = readStored();

  /** Whether Enter goes down one unit or along the unit's characteristics. */
  readonly order = signal<WalkOrder>(this.stored.order);
  /** Whether single letters act in the grid. */
  readonly letters = signal(this.stored.letters);
  /** The instrument last used of each kind, by id. */
  readonly instruments = signal(this.stored.instruments);
  /** The range named last of each instrument and way of reading; none where the smallest that holds the value is taken. */
  readonly ranges = signal(this.stored.ranges);
  readonly scope = signal(this.stored.scope);
  /** Whether people here write a decimal comma. */
  readonly decimalComma = DECIMAL_COMMA;

  /** Changes a setting and remembers it. */
  change<T>(setting: WritableSignal<T>, value: T): void {
    setting.set(value);
    const remembered: Remembered = {
      order: this.order(),
      letters: this.letters(),
      instruments: this.instruments(),
      ranges: this.ranges(),
      scope: this.scope(),
    };
    try {
      localStorage.setItem(KEY, JSON.stringify(remembered));
    } catch {
      // A browser that keeps nothing forgets the setting when the page is left; nothing depends on it.
    }
  }
}

function readStored(): Remembered {
  const stored = parsed();
  const order = WALK_ORDERS.find((each) => each === stored['order']) ?? 'by-characteristic';
  return {
    order,
    letters: stored['letters'] !== false,
    instruments: instrumentsOf(stored),
    ranges: entriesOf(stored['ranges'], (value) => typeof value === 'number'),
    scope: entriesOf(stored['scope'], (value) => typeof value === 'string'),
  };
}

function instrumentsOf(stored: Record<string, unknown>): Remembered['instruments'] {
  const given = recordOf(stored['instruments']);
  const known = INSTRUMENT_KINDS.map((kind) => [kind, given[kind]]).filter(([, id]) => typeof id === 'number');
  return Object.fromEntries(known) as Remembered['instruments'];
}

function entriesOf<T>(value: unknown, fits: (value: unknown) => value is T): Record<string, T> {
  const entries = Object.entries(recordOf(value)).filter((entry): entry is [string, T] => fits(entry[1]));
  return Object.fromEntries(entries);
}

function parsed(): Record<string, unknown> {
  try {
    return recordOf(JSON.parse(localStorage.getItem(KEY) ?? '{}'));
  } catch {
    return {};
  }
}

function recordOf(value: unknown): Record<string, unknown> {
  return typeof value === 'object' && value !== null ? { ...value } : {};
}
