import { type Review } from '#shared/contract/calibrations';

/** The days whose readings a review puts in doubt. */
export function doubtWords({ doubtFrom, doubtTo }: Pick<Review, 'doubtFrom' | 'doubtTo'>): string {
  return doubtFrom === null ? `all up to ${doubtTo}` : `${doubtFrom} to ${doubtTo}`;
}
