import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { cancelLot, correctLot, drawSample, type Lot, readLot } from '#shared/contract/lots';
import { ApiClient, endpointResource } from '../../data/api';
import { LastLots } from '../../lots/evidence/last-lots';
import { SamplingFacts } from '../../lots/evidence/sampling-facts';
import { AskReason } from '../../shell/reason-dialog/ask-reason';
import { may } from '../../session/may';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { type DrawableLot, DrawDialog } from '../draw-dialog/draw-dialog';
import { queueAt } from '../waiting';
import { PastTarget } from './past-target';

/** A lot that waits for its inspection: what it is, how it will be sampled, and the next step. */
@Component({
  selector: 'qr-arrival-panel',
  imports: [
    CountPipe,
    LastLots,
    Loaded,
    MatButton,
    MessageNote,
    MomentPipe,
    PageState,
    PastTarget,
    RouterLink,
    SamplingFacts,
  ],
  templateUrl: './arrival-panel.html',
  styleUrl: './arrival-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ArrivalPanel {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly reasons = inject(AskReason);

  readonly lotId = input.required<number>();
  readonly now = input.required<Date>();
  /** Whether the lot is the first of the queue. */
  readonly next = input(false);
  /** The lot has left the queue, or is another than it was. */
  readonly changed = output();

  protected readonly lot = endpointResource(readLot, () => ({ params: { id: this.lotId() } }));
  protected readonly mayDraw = may(drawSample);
  protected readonly mayCorrect = may(correctLot);
  protected readonly mayCancel = may(cancelLot);
  protected readonly waiting = computed(() =>
    this.lot.hasValue() ? queueAt(this.now(), [this.lot.value()])[0] : undefined,
  );

  /** Draws the sample of the shown lot once the person confirms it. */
  start(): void {
    const lot = this.lot.hasValue() ? this.lot.value() : undefined;
    if (lot?.status !== 'arrived' || lot.sampling === null || !this.mayDraw()) return;
    this.dialog
      .open<DrawDialog, DrawableLot, Lot>(DrawDialog, {
        data: { ...lot, sampling: lot.sampling },
        autoFocus: '.cancel',
      })
      .afterClosed()
      .subscribe((drawn) => {
        if (drawn) void this.router.navigate(['/lots', drawn.id, 'pull-list']);
        else this.lot.reload();
      });
  }

  protected cancel(lot: Lot): void {
    const { id, version, number, countedQuantity } = lot;
    const step = {
      title: `Cancel lot ${number}?`,
      text: [`${countedQuantity} units leave the queue. The number stays on record and is not used again.`],
      confirm: 'Cancel lot',
      leave: 'Keep lot',
      destructive: true,
      take: (reason: string) => this.api.call(cancelLot, { params: { id }, body: { reason }, version }),
    };
    this.reasons.ask(step).subscribe((taken) => {
      this.lot.reload();
      if (taken) this.changed.emit();
    });
  }
}
