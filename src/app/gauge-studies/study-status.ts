import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type GaugeStudyHead } from '#shared/contract/gauge-studies';
import { CountPipe } from '../ui/values/count-pipe';

/** Where a study stands: closed, whole, or how many of its readings are entered. */
@Component({
  selector: 'qr-study-status',
  imports: [CountPipe],
  template: `
    <span class="tag">{{ of().status === 'closed' ? 'Closed' : 'Open' }}</span>
    @if (missing() > 0) {
      <span class="small quiet">{{ of().entered | count }} of {{ of().needed | count }} readings</span>
    }
  `,
  styles: `
    :host {
      display: inline-flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 4px 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StudyStatus {
  readonly of = input.required<Pick<GaugeStudyHead, 'status' | 'entered' | 'needed'>>();

  protected readonly missing = computed(() => this.of().needed - this.of().entered);
}
