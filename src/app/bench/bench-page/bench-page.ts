import { ChangeDetectionStrategy, Component, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { readBench } from '#shared/contract/bench';
import { endpointResource } from '../../data/api';
import { type HoldsTyping } from '../../shell/leave-guard';
import { narrowerThan } from '../../shell/screen-width';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { ReadingQueue } from '../waiting/reading-queue';
import { BenchDesk } from './bench-desk';

/** The measuring page of one lot. It needs the room of a tablet at least. */
@Component({
  selector: 'qr-bench-page',
  imports: [BenchDesk, EmptyState, Loaded, MatButton, PageState, RouterLink],
  template: `
    @if (phone()) {
      <h1 class="unseen">Bench</h1>
      <qr-empty-state title="Use a tablet or a bench screen." text="The bench needs more room than this screen has.">
        <a matButton="outlined" [routerLink]="['/lots', id()]">Open the lot</a>
      </qr-empty-state>
    } @else {
      <qr-page-state what="The bench" [rows]="14" [rowHeight]="30">
        <ng-template [qrLoaded]="bench" let-bench>
          @if (bench) {
            <qr-bench-desk [bench]="bench" (stale)="reload()" />
          }
        </ng-template>
      </qr-page-state>
    }
  `,
  styles: `
    :host,
    qr-page-state {
      display: block;
      height: 100%;
    }
  `,
  host: { '(window:beforeunload)': 'warn($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage implements HoldsTyping {
  private readonly queue = inject(ReadingQueue);
  private readonly desk = viewChild(BenchDesk);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly phone = narrowerThan(600);
  protected readonly bench = endpointResource(readBench, () => ({ params: { id: this.id() } }));

  hasUnsaved(): boolean {
    return this.desk()?.hasUnsaved() ?? false;
  }

  protected reload(): void {
    this.bench.reload();
  }

  /** Kept readings survive a reload on this device; only what it could not write down needs the warning. */
  protected warn(event: Event): void {
    if (this.queue.atRisk()) event.preventDefault();
  }
}
