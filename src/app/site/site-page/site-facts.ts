import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Site } from '#shared/contract/site';

/** The settings of the site as text. */
@Component({
  selector: 'qr-site-facts',
  template: `
    <dl class="kv">
      <dt>Name</dt>
      <dd>{{ site().name }}</dd>
      <dt>Department</dt>
      <dd>{{ site().department }}</dd>
      <dt>Address</dt>
      <dd>{{ site().address || 'none' }}</dd>
      <dt>Engineering list</dt>
      <dd>{{ site().engineeringList.join('\\n') || 'nobody' }}</dd>
      <dt>Waiting target</dt>
      <dd class="mono">{{ site().waitingTargetHours }}&nbsp;h</dd>
      <dt>Plan approved by another person</dt>
      <dd>{{ site().approveOwnPlans ? 'waived' : 'required' }}</dd>
      <dt>Lot released by another person</dt>
      <dd>{{ site().releaseOwnReadings ? 'waived' : 'required' }}</dd>
      <dt>Instruments checked each day</dt>
      <dd>{{ site().dailyChecks ? 'asked' : 'not asked' }}</dd>
    </dl>
  `,
  styles: `
    dd {
      white-space: pre-line;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SiteFacts {
  readonly site = input.required<Site>();
}
