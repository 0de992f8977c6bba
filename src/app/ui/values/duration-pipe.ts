import { Pipe, type PipeTransform } from '@angular/core';
import { formatNumber } from '#shared/quantities/format-number';

const SPACE = '\u00a0';

/** A duration in words: 6 h 42 min; from a hundred hours on, days and hours. */
export function durationText(hours: number): string {
  const minutes = Math.max(0, Math.round(hours * 60));
  const wholeHours = Math.floor(minutes / 60);
  if (wholeHours < 100) return `${wholeHours}${SPACE}h ${minutes % 60}${SPACE}min`;
  return `${formatNumber(Math.floor(wholeHours / 24), 0)}${SPACE}d ${wholeHours % 24}${SPACE}h`;
}

/** `6.7 | duration` reads 6 h 42 min. The number is in hours. */
@Pipe({ name: 'duration' })
export class DurationPipe implements PipeTransform {
  transform(hours: number | null | undefined): string {
    return hours === null || hours === undefined ? '' : durationText(hours);
  }
}
