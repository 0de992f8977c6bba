import { ChangeDetectionStrategy, Component, computed, ElementRef, inject, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import { narrowerThan } from '../../../shell/screen-width';
import { SeverityMark } from '../../../ui/marks/severity-mark';
import { VerdictChip } from '../../../ui/marks/verdict-chip';
import { PartName } from '../../../ui/part-name';
import { CountPipe } from '../../../ui/values/count-pipe';
import { DurationPipe } from '../../../ui/values/duration-pipe';
import { WaitingBar } from '../../../ui/waiting-bar';
import { countWords, type WaitingLot } from '../../waiting';

/** The queue as a table; on a phone each lot is a card. The chosen row follows the arrow keys. */
@Component({
  selector: 'qr-queue-table',
  imports: [CountPipe, DurationPipe, PartName, RouterLink, SeverityMark, VerdictChip, WaitingBar],
  templateUrl: './queue-table.html',
  styleUrl: './queue-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QueueTable {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  private readonly narrow = narrowerThan(1280);

  readonly lots = input.required<readonly WaitingLot[]>();
  /** Id of the chosen lot. */
  readonly chosen = input<number>();
  /** Whether a lot opens on its own page instead of beside the queue. */
  readonly opens = input(false);
  readonly chosenChange = output<number>();

  protected readonly barWidth = computed(() => (this.narrow() ? 76 : 112));
  protected readonly countWords = countWords;

  /** Chooses the row below (+1) or above (-1) and takes the focus there. */
  move(rows: number): void {
    const lots = this.lots();
    const at = lots.findIndex(({ lot }) => lot.id === this.chosen());
    const to = lots[Math.min(Math.max(at + rows, 0), lots.length - 1)];
    if (to === undefined) return;
    this.element.querySelector<HTMLElement>(`[data-lot="${to.lot.id}"]`)?.focus();
    this.chosenChange.emit(to.lot.id);
  }
}
