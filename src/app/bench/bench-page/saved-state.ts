import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { Icon } from '../../ui/marks/icon';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { clockTime } from '../../ui/values/moment-pipe';
import { BenchSheet } from '../sheet/bench-sheet';
import { ReadingQueue } from '../waiting/reading-queue';

/** Whether everything typed has reached the server, told as it is. */
@Component({
  selector: 'qr-saved-state',
  imports: [Icon, VerdictMark],
  template: `
    <span role="status">
      @if (queue.atRisk()) {
        <qr-verdict-mark look="nok" />
        This browser cannot keep readings. Leave the page open until they are sent.
      } @else if (waiting() > 0) {
        <qr-verdict-mark look="hold" />
        {{ waiting() === 1 ? '1 reading' : waiting() + ' readings' }} waiting
      } @else if (queue.savedAt(); as at) {
        <qr-icon name="check" [size]="16" />
        Saved {{ time(at) }}
      }
    </span>
    @if (waiting() > 0 && queue.failing()) {
      <button type="button" class="link" (click)="queue.tryNow()">Try now</button>
    }
    @if (refused() > 0) {
      <button type="button" class="link nok" (click)="shown.emit()">
        {{ refused() === 1 ? '1 reading' : refused() + ' readings' }} refused
      </button>
    }
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 10px;
      color: var(--qr-ink-2);
      font: var(--qr-t-caption);
    }
    span {
      display: inline-flex;
      align-items: center;
      gap: 6px;
    }
    button {
      min-height: 28px;
      padding: 0;
      border: 0;
      background: none;
      font: inherit;
      font-weight: 500;
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SavedState {
  private readonly sheet = inject(BenchSheet);
  protected readonly queue = inject(ReadingQueue);

  /** The person wants to see what was refused. */
  readonly shown = output();

  protected readonly waiting = computed(() => this.ofLot(this.queue.waiting()));
  protected readonly refused = computed(() =>
    this.ofLot(this.queue.refused().filter(({ act }) => act.kind === 'reading')),
  );
  protected readonly time = clockTime;

  private ofLot(acts: readonly { act: { lotId: number } }[]): number {
    const { id } = this.sheet.bench().lot;
    return acts.filter(({ act }) => act.lotId === id).length;
  }
}
