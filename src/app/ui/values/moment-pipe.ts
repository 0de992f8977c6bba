import { Pipe, type PipeTransform } from '@angular/core';

/** How much of a moment is shown; `auto` shows what differs from now. */
export type MomentForm = 'auto' | 'full' | 'day' | 'seconds';

const two = (part: number) => String(part).padStart(2, '0');
const dayText = (moment: Date) => `${moment.getFullYear()}-${two(moment.getMonth() + 1)}-${two(moment.getDate())}`;
const timeText = (moment: Date) => `${two(moment.getHours())}:${two(moment.getMinutes())}`;

/** Time of day with seconds, local: 14:31:20. */
export function clockTime(moment: Date): string {
  return `${timeText(moment)}:${two(moment.getSeconds())}`;
}

/** A moment in local time: today the time only, in the same year 03-12 14:20, else 2025-11-03 14:20. */
export function momentText(moment: Date, form: MomentForm, now: Date): string {
  const day = dayText(moment);
  if (form === 'day') return day;
  if (form === 'seconds') return `${day} ${clockTime(moment)}`;
  if (form === 'auto' && day === dayText(now)) return timeText(moment);
  const sameYear = form === 'auto' && moment.getFullYear() === now.getFullYear();
  return `${sameYear ? day.slice(5) : day} ${timeText(moment)}`;
}

/** `lot.arrived | moment` reads 14:20, 03-12 14:20 or 2025-11-03 14:20; `| moment: 'full'` always has the date. */
@Pipe({ name: 'moment' })
export class MomentPipe implements PipeTransform {
  transform(moment: string | Date | null | undefined, form: MomentForm = 'auto', now = new Date()): string {
    if (moment === null || moment === undefined || moment === '') return '';
    return momentText(new Date(moment), form, now);
  }
}
