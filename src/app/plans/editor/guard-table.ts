import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { guardLines } from './guard-lines';
import { type PlanDraft } from './plan-draft';

/** What the site's finest instruments make of a plan: U of a usual reading, test uncertainty ratio, and what is accepted. */
@Component({
  selector: 'qr-guard-table',
  imports: [VerdictMark],
  template: `
    @if (lines().length > 0) {
      <div class="scroll-x">
        <table class="mini">
          <caption class="caption">
            A usual reading on the finest instrument in service
          </caption>
          <thead>
            <tr>
              <th scope="col">Characteristic</th>
              <th scope="col" class="right">U</th>
              <th scope="col" class="right">TUR</th>
              @if (guarded()) {
                <th scope="col">Accepted</th>
              }
            </tr>
          </thead>
          <tbody>
            @for (line of lines(); track line.key) {
              <tr>
                <td class="name">{{ line.name }}</td>
                <td class="num right">{{ line.uncertainty }}</td>
                <td class="num right">
                  @if (line.coarse) {
                    <qr-verdict-mark look="hold" [size]="12" label="coarse for its limits" />
                  }
                  {{ line.fineness }}
                </td>
                @if (guarded()) {
                  <td class="num">
                    @if (line.nothingLeft) {
                      <qr-verdict-mark look="nok" [size]="12" label="nothing is accepted" />
                    }
                    {{ line.accepted }}
                  </td>
                }
              </tr>
            }
          </tbody>
        </table>
      </div>
      <p class="caption">
        TUR = (upper − lower) / 2U, coarse under 4; with one limit, U as a share of the margin from target to limit.
      </p>
    }
  `,
  styles: `
    caption {
      padding-bottom: 4px;
      text-align: left;
    }
    .name {
      overflow-wrap: anywhere;
    }
    td.num {
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GuardTable {
  readonly draft = input.required<PlanDraft>();

  protected readonly guarded = computed(() => this.draft().settings().decisionRule !== 'simple');
  protected readonly lines = computed(() => guardLines(this.draft().content(), this.draft().instruments()));
}
