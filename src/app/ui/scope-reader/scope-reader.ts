import { ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, model, output } from '@angular/core';
import { displayUnit } from '#shared/quantities/display-unit';
import { type Coupling, type ScopeQuantity } from '#shared/measurement/scope-reading';
import { Segmented } from '../segmented';
import { MessageNote } from '../states/message-note';
import { readingDigits, readingText } from '../values/reading-text';
import { scopeAdvice } from './scope-advice';
import { ScopeRuler } from './scope-ruler';
import { type ScopeOutcome, readScopeText, type ScopeText, type ScopeTextField } from './scope-text';

interface ScopeFieldShown {
  readonly field: ScopeTextField;
  readonly label: string;
  readonly before: '' | '+' | '×';
  readonly prefix: string;
  readonly suffix: string;
}

const SETTINGS: readonly ScopeFieldShown[] = [
  { field: 'voltsPerDivision', label: 'Scale', before: '×', prefix: '', suffix: 'V/div' },
  { field: 'probeFactor', label: 'Probe', before: '×', prefix: '×', suffix: '' },
];
const WHOLE: readonly ScopeFieldShown[] = [
  { field: 'divisions', label: 'Wave height', before: '', prefix: '', suffix: 'div' },
  ...SETTINGS,
];
const HALVES: readonly ScopeFieldShown[] = [
  { field: 'upperDivisions', label: 'Upper, div', before: '', prefix: '', suffix: '' },
  { field: 'lowerDivisions', label: 'Lower, div', before: '+', prefix: '', suffix: '' },
  ...SETTINGS,
];

/**
 * Reads a wave off an oscilloscope: height in divisions, times the scale, times the probe, in the order of the formula.
 * The result follows every key. `entry` is what stands in the fields; the page keeps it, and remembers it per bench
 * without the heights. `expected` is what the part's rectifier can give, in volts; it advises and decides nothing.
 */
@Component({
  selector: 'qr-scope-reader',
  imports: [MessageNote, ScopeRuler, Segmented],
  templateUrl: './scope-reader.html',
  styleUrl: './scope-reader.scss',
  host: { '(keydown)': 'press($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScopeReader {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly entry = model.required<ScopeText>();
  readonly unit = input('V p-p');
  readonly decimals = input(2);
  readonly quantity = input<ScopeQuantity>('ripple');
  readonly expected = input<readonly [number, number] | null>(null);
  /** What the expected band rests on, or why there is none: "No rectifier model for this part." */
  readonly model = input('');
  /** Expanded uncertainty of the reading in volts, and what it consists of. */
  readonly uncertainty = input<{ readonly halfWidth: number; readonly reason: string } | null>(null);

  /** What the fields amount to, after every change. */
  readonly read = output<ScopeOutcome>();
  /** Enter and Escape in a field. */
  readonly kept = output();
  readonly left = output();

  protected readonly forms = [
    { value: 'whole', label: 'One whole wave' },
    { value: 'halves', label: 'Two halves' },
  ] as const;
  protected readonly couplings: readonly { value: Coupling; label: string }[] = [
    { value: 'ac', label: 'AC' },
    { value: 'dc', label: 'DC' },
  ];

  protected readonly fields = computed(() => (this.entry().form === 'whole' ? WHOLE : HALVES));
  private readonly outcome = computed(() => readScopeText(this.entry(), this.quantity()));
  protected readonly volts = computed(() => {
    const outcome = this.outcome();
    return outcome.kind === 'read' ? outcome.volts : null;
  });
  protected readonly refusal = computed(() => {
    const outcome = this.outcome();
    return outcome.kind === 'refused' ? outcome : null;
  });
  protected readonly digits = computed(() => readingDigits(this.volts() ?? 0, this.unit(), this.decimals()));
  protected readonly unitLabel = computed(() => displayUnit(this.unit()).label);
  protected readonly advice = computed(() => {
    const [volts, expected] = [this.volts(), this.expected()];
    return volts === null || expected === null ? null : scopeAdvice(volts, this.entry(), expected, this.model());
  });
  protected readonly spread = computed(() => {
    const uncertainty = this.uncertainty();
    if (uncertainty === null || this.volts() === null) return null;
    return {
      text: `± ${readingText(uncertainty.halfWidth, this.unit(), this.decimals())}`,
      reason: uncertainty.reason,
    };
  });

  /** Puts the cursor into the first field; text replaces what stands there, as when a digit was typed in the grid. */
  focusFirst(text?: string): void {
    const first = this.fields()[0];
    if (first === undefined) return;
    if (text !== undefined) this.type(first.field, text);
    const box = this.element.querySelector<HTMLInputElement>('.fields input');
    box?.focus();
    if (text === undefined) box?.select();
  }

  protected type(field: ScopeTextField, text: string): void {
    this.change({ [field]: text });
  }

  protected change(part: Partial<ScopeText>): void {
    this.entry.set({ ...this.entry(), ...part });
    this.read.emit(this.outcome());
  }

  protected press(event: KeyboardEvent): void {
    if (event.key === 'Enter' && event.target instanceof HTMLInputElement && event.target.type === 'text') {
      event.preventDefault();
      this.kept.emit();
    } else if (event.key === 'Escape') {
      event.stopPropagation();
      this.left.emit();
    } else if (event.key === 'F2') {
      this.applyCure(event);
    }
  }

  protected applyCure(event?: Event): void {
    const cure = this.advice()?.cure;
    if (cure === undefined) return;
    event?.preventDefault();
    event?.stopPropagation();
    this.change(cure.entry);
  }
}
