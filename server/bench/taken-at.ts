/**
 * When a reading was taken: as the clock of the bench says, but neither before the draw of the sample nor after its
 * receipt. A clock that goes wrong dates no reading before there was a unit to measure or after the reading was here.
 *
 * @param stated instant by the clock of the bench
 * @param drawnAt when the sample was drawn
 */
export function takenAt(stated: string, drawnAt: string | null, receivedAt: Date): string {
  const drawn = drawnAt === null ? -Infinity : Date.parse(drawnAt);
  const instant = Math.min(Math.max(Date.parse(stated), drawn), receivedAt.getTime());
  return new Date(instant).toISOString();
}
