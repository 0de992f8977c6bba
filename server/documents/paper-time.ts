/** An instant as papers and letters print it, whose readers may sit anywhere: "2026-03-18 15:06 UTC". */
export function utcMinute(instant: string): string {
  return `${new Date(instant).toISOString().slice(0, 16).replace('T', ' ')} UTC`;
}

/** The day of an instant in UTC: "2026-03-18". */
export function utcDay(instant: string): string {
  return new Date(instant).toISOString().slice(0, 10);
}
