import { ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { CONFIRM_REASON_TITLES, CONFIRM_REASONS } from '#shared/contract/bench';
import { VerdictMark } from '../../../ui/marks/verdict-mark';
import { type Confirmation } from '../../waiting/bench-act';
import { StillTyping } from '../dialogs/still-typing';

let questions = 0;

/**
 * A reading far from what the part can give is corrected, or kept with a reason; never silently either way. Keys 1 to 5
 * choose the reason, Enter keeps; F2 takes the offered correction, Esc goes back to the fields.
 */
@Component({
  selector: 'qr-plausibility-question',
  imports: [MatButton, VerdictMark],
  templateUrl: './plausibility-question.html',
  styleUrl: './plausibility-question.scss',
  host: { role: 'group', tabindex: '-1', '[attr.aria-labelledby]': 'id', '(keydown)': 'press($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlausibilityQuestion {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly typing = new StillTyping();

  readonly sentence = input.required<string>();
  /** What keeping it would mean beside: "Nonconforming: ...". */
  readonly consequence = input('');
  /** What the offered correction does: "Use × 1"; empty where none is offered. */
  readonly cure = input('');
  /** The way to another value: "Type again", "Repeat". */
  readonly otherwise = input('Type again');
  readonly keeping = input('Keep with this reason');
  readonly confirmed = output<Confirmation>();
  readonly cured = output();
  readonly left = output();

  protected readonly id = `qr-question-${++questions}`;
  protected readonly reasons = CONFIRM_REASONS.map((value) => ({ value, title: CONFIRM_REASON_TITLES[value] }));
  protected readonly reason = signal<Confirmation['reason'] | null>(null);
  protected readonly note = signal('');
  protected readonly tried = signal(false);
  /** What is still missing; "other" needs a few words. */
  protected readonly lacking = computed(() => {
    if (this.reason() === null) return 'Choose a reason.';
    return this.reason() === 'other' && this.note().trim() === '' ? 'Say in a few words what it is.' : '';
  });

  /** Puts the question before a person who works with the keys. */
  focus(): void {
    this.element.focus();
  }

  protected take(): void {
    this.tried.set(true);
    const reason = this.reason();
    if (reason !== null && this.lacking() === '') this.confirmed.emit({ reason, note: this.note().trim() });
  }

  protected press(event: KeyboardEvent): void {
    if (this.typing.isMeant(event)) return event.preventDefault();
    const inNote = event.target instanceof HTMLInputElement && event.target.type === 'text';
    const onButton = event.target instanceof HTMLButtonElement;
    const chosen = inNote ? undefined : this.reasons[Number(event.key) - 1];
    if (chosen !== undefined) this.reason.set(chosen.value);
    else if (event.key === 'Enter' && !onButton) this.take();
    else if (event.key === 'Escape') this.left.emit();
    else if (event.key === 'F2' && this.cure() !== '') this.cured.emit();
    else return;
    event.preventDefault();
    event.stopPropagation();
  }
}
