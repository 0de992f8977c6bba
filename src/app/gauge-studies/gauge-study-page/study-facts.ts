import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type GaugeStudy } from '#shared/contract/gauge-studies';
import { LimitsPipe } from '../../ui/values/limits-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** What a study is about. */
@Component({
  selector: 'qr-study-facts',
  imports: [LimitsPipe, MomentPipe, RouterLink],
  template: `
    <dl class="kv">
      <dt>Instrument</dt>
      <dd>
        <a class="link" [routerLink]="['/instruments', study().instrument.id]">{{ study().instrument.assetNumber }}</a>,
        {{ study().instrument.description }}
      </dd>
      <dt>Quantity</dt>
      <dd>{{ study().quantity }}</dd>
      <dt>Limits</dt>
      <dd>
        {{ { lower: study().lowerLimit, upper: study().upperLimit } | limits: study().unit : study().decimals }}
      </dd>
      <dt>Size</dt>
      <dd>{{ study().parts.length }} parts, {{ study().persons.length }} persons, {{ study().trials }} trials each</dd>
      <dt>Persons</dt>
      <dd>{{ study().persons.join(', ') }}</dd>
      <dt>Begun</dt>
      <dd>{{ study().createdAt | moment: 'full' }}, {{ study().author }}</dd>
      @if (study().closedAt; as closed) {
        <dt>Closed</dt>
        <dd>{{ closed | moment: 'full' }}</dd>
      }
      @if (study().note) {
        <dt>Note</dt>
        <dd class="lines">{{ study().note }}</dd>
      }
    </dl>
    <ng-content />
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
      align-content: start;
    }
    dd {
      overflow-wrap: anywhere;
    }
    .lines {
      white-space: pre-line;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StudyFacts {
  readonly study = input.required<GaugeStudy>();
}
