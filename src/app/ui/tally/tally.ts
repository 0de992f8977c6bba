import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { elementWidth } from '../element-width';
import { CountPipe } from '../values/count-pipe';
import { BASE, CELL, pitchOf, tallyShapes, type UnitState } from './tally-shapes';

const SPOKEN = [
  ['critical', 'critical'],
  ['major', 'major'],
  ['minor', 'minor'],
  ['hold', 'undecided'],
] as const;

/** Distances between the unit numbers below the line, of which at most six are shown. */
const STEPS = [5, 10, 20, 50, 100, 200, 500];

/**
 * The sample at a glance, unit by unit in draw order: a good lot is a flat line, a nonconforming unit a spike as tall as
 * its class is grave. Takes the width of its place; 500 units and more. `states` has one entry per unit of the sample.
 */
@Component({
  selector: 'qr-tally',
  imports: [CountPipe],
  templateUrl: './tally.html',
  styleUrl: './tally.scss',
  host: { role: 'img', '[attr.aria-label]': 'sentence()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Tally {
  readonly states = input.required<readonly UnitState[]>();
  /** Index of the unit being measured, from 0. */
  readonly current = input<number | null>(null);
  /** Whether unit numbers stand below the line. */
  readonly axis = input(false);
  /** Further words for the accessible name: "2 more to reject". */
  readonly note = input('');

  protected readonly width = elementWidth(480);
  protected readonly height = computed(() => (this.axis() ? 56 : 40));
  protected readonly shapes = computed(() => tallyShapes(this.states(), this.width()));

  protected readonly frame = computed(() => {
    const current = this.current();
    if (current === null) return null;
    const pitch = pitchOf(this.states().length, this.width());
    const width = Math.max(pitch - (pitch >= 3.2 ? 1 : 0), 2);
    return {
      x: current * pitch - 1,
      y: BASE - 1,
      width: width + 2,
      height: CELL + 2,
      centre: current * pitch + width / 2,
    };
  });

  protected readonly numbers = computed(() => {
    const units = this.states().length;
    const pitch = pitchOf(units, this.width());
    const step = STEPS.find((candidate) => candidate * 6 >= units) ?? units;
    const inner = Array.from({ length: Math.floor(units / step) }, (_, index) => (index + 1) * step);
    const shown = [1, ...inner.filter((unit) => units - unit >= step / 2), units];
    return [...new Set(shown)].map((unit) => ({
      unit,
      x: (unit - 0.5) * pitch,
      anchor: unit === 1 ? 'start' : unit === units ? 'end' : 'middle',
    }));
  });

  protected readonly sentence = computed(() => {
    const states = this.states();
    const judged = states.filter((state) => state !== null && state !== 'hold').length;
    const found = SPOKEN.map(([state, word]) => ({ word, count: states.filter((unit) => unit === state).length }))
      .filter(({ count }) => count > 0)
      .map(({ word, count }) => `${word} ${count}`);
    return [`${judged} of ${states.length} judged`, ...found, this.note()].filter((part) => part !== '').join(', ');
  });
}
