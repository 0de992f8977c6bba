import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Rack } from '#shared/contract/racks';

/** A rack's values as text. */
@Component({
  selector: 'qr-rack-facts',
  template: `
    <dl class="kv">
      <dt>Name</dt>
      <dd>{{ rack().name }}</dd>
      <dt>Place</dt>
      <dd>{{ rack().place || 'none' }}</dd>
      <dt>Parts</dt>
      <dd>
        @for (part of rack().parts; track part.id) {
          <div>
            <span class="ident">{{ part.number }}</span>
            {{ part.name }}
          </div>
        } @empty {
          none
        }
      </dd>
      <dt>Columns of its files</dt>
      <dd>
        @for (column of columns(); track column.heading) {
          <div>
            {{ column.heading }}:
            <span class="mono">{{ column.means }}</span>
          </div>
        } @empty {
          stand for themselves
        }
      </dd>
      <dt>Status</dt>
      <dd>{{ rack().active ? 'In use' : 'Out of use' }}</dd>
    </dl>
  `,
  styles: `
    dd {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackFacts {
  readonly rack = input.required<Rack>();

  protected readonly columns = computed(() =>
    Object.entries(this.rack().mapping).map(([heading, meaning]) => ({ heading, means: meaning ?? 'skipped' })),
  );
}
