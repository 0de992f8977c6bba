import { Pipe, type PipeTransform } from '@angular/core';
import { formatQuantity, type FormatQuantityOptions } from '#shared/quantities/format-quantity';

/** `0.0022 | quantity: 'F'` reads 2 200 µF: an SI value with the prefix that reads best. */
@Pipe({ name: 'quantity' })
export class QuantityPipe implements PipeTransform {
  transform(value: number | null | undefined, unit: string, options?: FormatQuantityOptions): string {
    return value === null || value === undefined ? '' : formatQuantity(value, unit, options);
  }
}
