import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Part } from '#shared/contract/parts';
import {
  LINE_TOLERANCE,
  LOAD_TOLERANCE,
  USUAL_CAPACITOR_TOLERANCE,
} from '#shared/measurement/rectifier/expected-bands';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { ScrollRegion } from '../../ui/scroll-region';
import { expectedOutput } from './expected-output';
import { RippleChart } from './ripple-chart';

/** What a part's rectifier ought to give: bands that readings are compared with, the wave, and the textbook beside them. */
@Component({
  selector: 'qr-expected-output-sheet',
  imports: [RippleChart, ScrollRegion],
  template: `
    <h2>What it ought to give</h2>
    @let it = output();
    @if (it.kind === 'unknown') {
      <p class="small quiet">{{ it.why }}</p>
    } @else {
      <qr-ripple-chart [wave]="it.wave" [lineHertz]="it.lineHertz" [sentence]="sentence()" />
      <div qrScrollRegion="Table of the expected output">
        <table class="mini">
          <thead>
            <tr>
              <th scope="col">At the rated current</th>
              <th scope="col">Expected</th>
              <th scope="col" class="right">Model</th>
              <th scope="col" class="right">Textbook</th>
              <th scope="col" class="right">Off by</th>
            </tr>
          </thead>
          <tbody>
            @for (row of it.rows; track row.name) {
              <tr>
                <th scope="row">{{ row.name }}</th>
                <td class="num">{{ row.band }}</td>
                <td class="num right">{{ row.nominal }}</td>
                <td class="num right">{{ row.textbook }}</td>
                <td class="num right">{{ row.off }}</td>
              </tr>
            }
          </tbody>
        </table>
      </div>
      <p class="small"><b>Textbook</b> {{ it.reason }}</p>
      <p class="caption">
        {{ tolerances() }} Readings outside are noted at the bench; three times farther they raise a question. Textbook
        forms: Vpp = I / (f C) with 0.7 V for each diode.
      </p>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 10px;
    }
    td {
      white-space: nowrap;
    }
    tbody th {
      height: 26px;
      border-bottom-color: var(--qr-line);
      color: var(--qr-ink);
      font: var(--qr-t-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExpectedOutputSheet {
  readonly part = input.required<Pick<Part, 'model' | 'expected'>>();

  protected readonly output = computed(() => expectedOutput(this.part().model, this.part().expected));
  protected readonly sentence = computed(() => {
    const output = this.output();
    if (output.kind === 'unknown') return '';
    return `Modelled output over two line cycles: ripple ${output.ripple} peak to peak at ${output.rippleHertz}.`;
  });
  protected readonly tolerances = computed(() => {
    const capacitor = this.part().model.filterTolerance ?? USUAL_CAPACITOR_TOLERANCE;
    const percent = (fraction: number) => `±${formatQuantity(fraction, '%')}`;
    return `Expected: over the corners of the capacitor ${percent(capacitor)}, the mains ${percent(LINE_TOLERANCE)} and the load ${percent(LOAD_TOLERANCE)}, as computed when the part was saved.`;
  });
}
