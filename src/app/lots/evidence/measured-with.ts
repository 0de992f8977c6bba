import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Assessment } from '#shared/contract/decision';
import { DECISION_RULE_TITLES } from '#shared/contract/plans';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** Who measured, when, with what, and what was out of the ordinary: repeats and units set aside. */
@Component({
  selector: 'qr-measured-with',
  imports: [CountPipe, MomentPipe],
  templateUrl: './measured-with.html',
  styles: `
    :host {
      display: block;
    }
    h2 {
      margin-bottom: 8px;
    }
    h3 {
      margin-top: 14px;
    }
    .kv dd {
      overflow-wrap: anywhere;
    }
    ul {
      margin: 0;
      padding: 0 0 0 16px;
      font: var(--qr-t-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MeasuredWith {
  readonly assessment = input.required<Assessment>();

  protected readonly rule = computed(() => DECISION_RULE_TITLES[this.assessment().decisionRule]);
  protected readonly takers = computed(() => this.assessment().takenBy.join(', '));
}
