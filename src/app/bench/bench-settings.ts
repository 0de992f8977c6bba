import { Injectable, signal, type WritableSignal } from '@angular/core';
import { INSTRUMENT_KINDS, type InstrumentKind } from '#shared/contract/instruments';
import { WALK_ORDERS, type WalkOrder } from '#shared/bench/grid-walk';

const KEY = 'quietrail.bench';

interface Remembered {
  order: WalkOrder;
  letters: boolean;
  instruments: Partial<Record<InstrumentKind, number>>;
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
  readonly scope = signal(this.stored.scope);
  /** Whether people here write a decimal comma. */
  readonly decimalComma = new Intl.NumberFormat(navigator.language).format(0.5).includes(',');

  /** Changes a setting and remembers it. */
  change<T>(setting: WritableSignal<T>, value: T): void {
    setting.set(value);
    const remembered: Remembered = {
      order: this.order(),
      letters: this.letters(),
      instruments: this.instruments(),
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
    scope: textsOf(stored['scope']),
  };
}

function instrumentsOf(stored: Record<string, unknown>): Remembered['instruments'] {
  const given = recordOf(stored['instruments']);
  const known = INSTRUMENT_KINDS.map((kind) => [kind, given[kind]]).filter(([, id]) => typeof id === 'number');
  return Object.fromEntries(known) as Remembered['instruments'];
}

function textsOf(value: unknown): Record<string, string> {
  const texts = Object.entries(recordOf(value)).filter(
    (entry): entry is [string, string] => typeof entry[1] === 'string',
  );
  return Object.fromEntries(texts);
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
