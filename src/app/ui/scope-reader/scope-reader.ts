import { ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, model, output } from '@angular/core';
import { displayUnit } from '#shared/quantities/display-unit';
import { type ExpectedBand } from '#shared/measurement/plausibility';
import { type AlternatePeaks, type Coupling, type ScopeQuantity } from '#shared/measurement/scope-reading';
import { Segmented } from '../segmented';
import { MessageNote } from '../states/message-note';
import { DECIMAL_COMMA } from '../values/decimal-comma';
import { readingDigits } from '../values/reading-text';
import { scopeAdvice } from './scope-advice';
import { countsWords, scopeFields } from './scope-fields';
import { ScopeRuler } from './scope-ruler';
import { type ScopeOutcome, readScopeText, type ScopeText, type ScopeTextField } from './scope-text';

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
  /** Which of two alternate peaks counts. */
  readonly alternatePeaks = input<AlternatePeaks>('worst');
  readonly decimalComma = input(DECIMAL_COMMA);
  readonly expected = input<ExpectedBand | null>(null);
  /** Why there is no expected band: "No rectifier model for this part." */
  readonly model = input('');
  /** The step to which the graticule is read, in divisions; null where the range is not known. */
  readonly step = input<number | null>(null);
  /** U of the reading as it is written, and what it consists of. */
  readonly uncertainty = input<{ readonly text: string; readonly reason: string } | null>(null);
  /** Whether the advice stands elsewhere, as a question to be answered. */
  readonly asked = input(false);

  /** What the fields amount to, after every change. */
  readonly read = output<ScopeOutcome>();
  /** The offered correction is taken; comes before the fields change. */
  readonly cured = output();
  /** Enter and Escape in a field. */
  readonly kept = output();
  readonly left = output();

  protected readonly forms = [
    { value: 'whole', label: 'One wave' },
    { value: 'halves', label: 'Two halves' },
    { value: 'alternate', label: 'Alternate peaks' },
  ] as const;
  protected readonly couplings: readonly { value: Coupling; label: string }[] = [
    { value: 'ac', label: 'AC' },
    { value: 'dc', label: 'DC' },
  ];

  protected readonly fields = computed(() => scopeFields(this.entry().form, this.alternatePeaks()));
  private readonly outcome = computed(() =>
    readScopeText(this.entry(), {
      quantity: this.quantity(),
      alternatePeaks: this.alternatePeaks(),
      decimalComma: this.decimalComma(),
    }),
  );
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
    const [outcome, expected] = [this.outcome(), this.expected()];
    return outcome.kind !== 'read' || expected === null ? null : scopeAdvice(outcome, this.entry(), expected);
  });
  protected readonly shown = computed(() => (this.asked() ? null : this.advice()));
  protected readonly counts = computed(() => countsWords(this.entry().form, this.alternatePeaks()));
  protected readonly stepWords = computed(() => (this.step() === null ? '' : `read to ${this.step()} div`));

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
    const cure = this.shown()?.cure ?? null;
    if (cure === null) return;
    event?.preventDefault();
    event?.stopPropagation();
    this.cured.emit();
    this.change(cure.entry);
  }
}
