import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Lot } from '#shared/contract/lots';
import { BackLink } from '../../shell/back-link';
import { CountPipe } from '../../ui/values/count-pipe';

/** Head of a page about one lot: where it stands, its number, part, supplier and plan; actions as content. */
@Component({
  selector: 'qr-lot-head',
  imports: [BackLink, CountPipe],
  template: `
    @let shown = lot();
    <header class="record-head">
      <qr-back-link [to]="back()">{{ backTitle() }}</qr-back-link>
      <div class="named">
        <span class="caption">Lot</span>
        <h1 class="ident-large">{{ shown.number }}</h1>
      </div>
      <div class="fact">
        <b>{{ shown.part.number }}</b>
        <span>{{ shown.part.name }}</span>
      </div>
      <div class="fact">
        <b>{{ shown.supplier.name }}</b>
        <span>{{ shown.countedQuantity | count }} units, delivery {{ shown.deliveryNumber }}</span>
      </div>
      @if (shown.sampling; as sampling) {
        <div class="fact">
          <b>Plan {{ sampling.planNumber }} rev {{ sampling.revision }}</b>
          <span>
            Level {{ sampling.level }}, letter {{ letter() }}, n = {{ sampling.sampleSize | count }},
            {{ sampling.severity }}{{ sampling.provisional ? ', provisional' : '' }}
          </span>
        </div>
      }
      <div class="actions"><ng-content /></div>
    </header>
  `,
  styles: `
    .fact {
      max-width: 320px;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotHead {
  readonly lot = input.required<Lot>();
  readonly back = input.required<string>();
  readonly backTitle = input.required<string>();

  protected readonly letter = computed(() => {
    const sampling = this.lot().sampling;
    return (sampling?.groups.find((group) => group.level === sampling.level) ?? sampling?.groups[0])?.codeLetter ?? '';
  });
}
