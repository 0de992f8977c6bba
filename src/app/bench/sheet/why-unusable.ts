import { type Instrument } from '#shared/contract/instruments';

/** Why an instrument cannot take a reading today, in a few words; empty where it can. */
export function whyUnusable({ status, usable, daysLeft, calibrationDue, dailyCheck, openReview }: Instrument): string {
  if (usable) return '';
  if (status === 'withdrawn') return openReview ? `withdrawn, review ${openReview.number} is open` : 'withdrawn';
  if (daysLeft < 0) return `past its calibration date ${calibrationDue}`;
  if (dailyCheck === 'failed') return 'failed its check of today';
  return dailyCheck === 'due' ? 'to be checked before its first reading of the day' : 'not to be used today';
}

/** Whether only the check of the day stands between the instrument and a reading. */
export function waitsForCheck({ status, daysLeft, dailyCheck }: Instrument): boolean {
  return status === 'in-service' && daysLeft >= 0 && (dailyCheck === 'due' || dailyCheck === 'failed');
}
