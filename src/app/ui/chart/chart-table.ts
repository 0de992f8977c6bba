import { Directive, inject, TemplateRef } from '@angular/core';

/** Marks the template of a `qr-chart` that says the same as a table. */
@Directive({ selector: 'ng-template[qrChartTable]' })
export class ChartTable {
  readonly template = inject<TemplateRef<unknown>>(TemplateRef);
}
