/** Time as the program sees it; tests hold it still. */
export interface Clock {
  now(): Date;
}

export const systemClock: Clock = { now: () => new Date() };
