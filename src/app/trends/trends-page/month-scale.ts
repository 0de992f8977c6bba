/** Height of a chart's drawing, and the room above it for labels and below it for months, in px. */
export const CHART = { height: 132, above: 22, below: 22 } as const;

/** Centre of each month on a chart `width` px wide, and the pitch between months. */
export function monthPlaces(months: number, width: number): { pitch: number; at: (month: number) => number } {
  const pitch = width / Math.max(months, 1);
  return { pitch, at: (month) => (month + 0.5) * pitch };
}

/** Every how many months a label fits, when one takes `room` px. */
export function labelStep(pitch: number, room: number): number {
  return Math.max(1, Math.ceil(room / pitch));
}
