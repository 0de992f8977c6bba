import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { elementWidth } from '../element-width';
import { plateTrace, type PlateVariant } from './plate-trace';

const WORDS: Readonly<Record<PlateVariant, string>> = {
  accepted: 'ACCEPTED',
  rejected: 'REJECTED',
  'on-hold': 'ON HOLD',
  concession: 'CONCESSION',
  continue: 'CONTINUE',
  stop: 'STOP',
};

/** Room that frame and padding take from the trace, in px. */
const INSETS: Readonly<Record<PlateVariant, number>> = {
  accepted: 54,
  rejected: 54,
  'on-hold': 56,
  concession: 56,
  continue: 54,
  stop: 54,
};

/**
 * A verdict, readable from two metres: a word, an outline that differs by verdict, and the line below it. The four corners
 * take identifier, time, reason and stamp. STOP interrupts a screen reader; `animated` lets the line of ACCEPTED settle once.
 */
@Component({
  selector: 'qr-verdict-plate',
  templateUrl: './verdict-plate.html',
  styleUrl: './verdict-plate.scss',
  host: { '[class]': 'variant()', '[class.large]': 'large()', '[class.animated]': 'animated()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictPlate {
  readonly variant = input.required<PlateVariant>();
  /** Another word than the variant's own. */
  readonly word = input('');
  readonly topLeft = input('');
  readonly topRight = input('');
  readonly bottomLeft = input('');
  readonly bottomRight = input('');
  /** 72 px instead of 56 px, for tablets. */
  readonly large = input(false);
  /** Whether the line is drawn; a low screen does without. */
  readonly trace = input(true);
  readonly animated = input(false);

  private readonly width = elementWidth(348);

  protected readonly shown = computed(() => this.word() || WORDS[this.variant()]);
  protected readonly traceWidth = computed(() => Math.max(this.width() - INSETS[this.variant()], 120));
  protected readonly strokes = computed(() => plateTrace(this.variant(), this.traceWidth()));
}
