import { Pipe, type PipeTransform } from '@angular/core';
import { formatNumber } from '#shared/quantities/format-number';

/** `1200 | count` reads 1 200, with a narrow no-break space. */
@Pipe({ name: 'count' })
export class CountPipe implements PipeTransform {
  transform(count: number | null | undefined): string {
    return count === null || count === undefined ? '' : formatNumber(count, 0);
  }
}
