import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { VerdictMark } from '../marks/verdict-mark';
import { type Failure } from '../page-state/resource-like';
import { clockTime } from '../values/moment-pipe';

/** What failed, what the server said and when, and the two things that help: trying again and passing the details on. */
@Component({
  selector: 'qr-problem-note',
  imports: [MatButton, VerdictMark],
  template: `
    <qr-verdict-mark look="nok" [size]="24" />
    <p class="title">{{ what() }} did not load.</p>
    <p class="quiet">{{ sentence() }}</p>
    <div class="action">
      <button type="button" matButton="outlined" (click)="retry.emit()">Try again</button>
      <button type="button" matButton (click)="copyDetails()">{{ copied() ? 'Copied' : 'Copy details' }}</button>
    </div>
  `,
  styleUrl: './state.scss',
  host: { role: 'alert' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemNote {
  private readonly clipboard = inject(Clipboard);

  /** Names the thing at the start of a sentence: "The queue". */
  readonly what = input.required<string>();
  readonly failure = input.required<Failure>();
  readonly retry = output();

  protected readonly copied = signal(false);

  protected readonly sentence = computed(() => {
    const { message, status, at } = this.failure();
    const answered = status > 0 ? ` The server answered ${status}` : '';
    const when = at ? `${answered === '' ? ' Tried' : ''} at ${clockTime(at)}.` : answered === '' ? '' : '.';
    return `${message}${answered}${when}`;
  });

  protected copyDetails(): void {
    const { message, status, code, at } = this.failure();
    const lines = [`${this.what()} did not load.`, message, `Status ${status}`, code, at?.toISOString()];
    this.copied.set(this.clipboard.copy(lines.filter((line) => line !== undefined).join('\n')));
  }
}
