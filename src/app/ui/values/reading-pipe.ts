import { Pipe, type PipeTransform } from '@angular/core';
import { readingText } from './reading-text';

/** `0.185 | reading: 'mV p-p' : 0` reads 185 mV p-p: an SI value in its characteristic's unit with fixed decimals. */
@Pipe({ name: 'reading' })
export class ReadingPipe implements PipeTransform {
  transform(value: number | null | undefined, unit: string, decimals: number): string {
    return value === null || value === undefined ? '' : readingText(value, unit, decimals);
  }
}
