import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Supplier } from '#shared/contract/suppliers';

/** A supplier's values as text. */
@Component({
  selector: 'qr-supplier-facts',
  template: `
    <dl class="kv">
      <dt>Code</dt>
      <dd class="mono">{{ supplier().code }}</dd>
      <dt>Name</dt>
      <dd>{{ supplier().name }}</dd>
      <dt>Address</dt>
      <dd class="lines">{{ supplier().address || 'none' }}</dd>
      <dt>Contact person</dt>
      <dd>{{ supplier().contactName || 'none' }}</dd>
      <dt>Contact e-mail</dt>
      <dd>{{ supplier().contactEmail ?? 'none' }}</dd>
      <dt>Status</dt>
      <dd>{{ supplier().active ? 'In use' : 'Not in use' }}</dd>
    </dl>
  `,
  styles: `
    dd {
      overflow-wrap: anywhere;
    }
    .lines {
      white-space: pre-line;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SupplierFacts {
  readonly supplier = input.required<Supplier>();
}
