import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type RackPreview } from '#shared/contract/bench';
import { CountPipe } from '../../ui/values/count-pipe';

/** Faults listed; a file with more of them is rather the wrong file. */
const LISTED = 200;

/** Everything that is wrong in a rack file, with line, column and reason. */
@Component({
  selector: 'qr-rack-faults',
  imports: [CountPipe],
  template: `
    <h3>{{ faults().length | count }} {{ faults().length === 1 ? 'fault' : 'faults' }}</h3>
    <div class="scroll" tabindex="0" role="region" aria-label="Faults of the file">
      <table class="table">
        <thead>
          <tr>
            <th scope="col" class="right">Line</th>
            <th scope="col">Column</th>
            <th scope="col">What is wrong</th>
          </tr>
        </thead>
        <tbody>
          @for (fault of listed(); track $index) {
            <tr>
              <td class="num right">{{ fault.line | count }}</td>
              <td class="mono">{{ fault.column ?? '' }}</td>
              <td class="what">{{ fault.message }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    @if (faults().length > listed().length) {
      <p class="caption">The first {{ listed().length }} are listed.</p>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .scroll {
      max-height: 360px;
      margin-top: 8px;
      overflow: auto;
      border: 1px solid var(--qr-line);
      border-radius: var(--qr-r-control);
    }
    .table {
      --qr-table-row: 30px;
    }
    .what {
      width: 100%;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackFaults {
  readonly faults = input.required<RackPreview['faults']>();
  protected readonly listed = computed(() => this.faults().slice(0, LISTED));
}
