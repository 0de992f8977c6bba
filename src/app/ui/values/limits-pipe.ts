import { Pipe, type PipeTransform } from '@angular/core';
import { formatLimits } from '#shared/quantities/format-limits';

interface Limits {
  lower: number | null;
  upper: number | null;
}

/** `{ lower, upper } | limits: 'V' : 2` reads max 2.40 V, min 100 MΩ or 15.80 to 18.20 V; limits are in SI base units. */
@Pipe({ name: 'limits' })
export class LimitsPipe implements PipeTransform {
  transform(limits: Limits, unit: string, decimals: number): string {
    return formatLimits(limits.lower, limits.upper, unit, decimals);
  }
}
