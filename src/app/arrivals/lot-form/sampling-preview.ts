import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { debounceTime } from 'rxjs';
import { previewSampling } from '#shared/contract/lots';
import { type Part } from '#shared/contract/parts';
import { endpointResource } from '../../data/api';
import { SamplingFacts } from '../../lots/evidence/sampling-facts';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';

/** Largest lot that is booked in at once. */
const MOST = 1_000_000;
/** Pause in typing, in ms, after which the server is asked. */
const PAUSE = 250;

/** How a lot of this part and size would be sampled now. */
@Component({
  selector: 'qr-sampling-preview',
  imports: [Loaded, MessageNote, PageState, SamplingFacts],
  template: `
    @if (part(); as known) {
      @if (!known.plan || known.plan.effectiveRevision === null) {
        <qr-message-note look="hold">
          {{ known.number }} has no plan in force. The lot can be booked in; its sample is drawn once there is one.
        </qr-message-note>
      } @else if (asked()) {
        <qr-page-state what="The sampling" [rows]="6" [rowHeight]="26" [keepPrevious]="true">
          <ng-template [qrLoaded]="sampling" let-shown>
            @if (shown) {
              <qr-sampling-facts [sampling]="shown" />
            }
          </ng-template>
        </qr-page-state>
      } @else {
        <p class="small quiet">Type the counted quantity to see the sample.</p>
      }
    } @else {
      <p class="small quiet">Choose the part and type the counted quantity to see the sample.</p>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SamplingPreview {
  readonly part = input.required<Part | undefined>();
  readonly lotSize = input.required<number | null>();

  private readonly question = computed(() => {
    const part = this.part();
    const lotSize = this.lotSize();
    const judgeable = lotSize !== null && lotSize >= 1 && lotSize <= MOST;
    if (!judgeable || (part?.plan?.effectiveRevision ?? null) === null) return undefined;
    return { partId: part?.id, lotSize };
  });
  protected readonly asked = toSignal(toObservable(this.question).pipe(debounceTime(PAUSE)));
  protected readonly sampling = endpointResource(previewSampling, () => {
    const asked = this.asked();
    return asked && { query: asked };
  });
}
