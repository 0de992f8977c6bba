const DAY = 86_400_000;

/** A moment of a day, UTC. */
export function timeOn(day: Date, hour: number, minute = 0): Date {
  return new Date(day.getTime() + (hour * 60 + minute) * 60_000);
}

export function later(moment: Date, minutes: number): Date {
  return new Date(moment.getTime() + Math.round(minutes * 60) * 1000);
}

/** Monday to Friday from `first` to `last`, each as its midnight, UTC. */
export function workDays(first: Date, last: Date): Date[] {
  const days: Date[] = [];
  for (let at = Math.ceil(first.getTime() / DAY) * DAY; at <= last.getTime(); at += DAY) {
    const weekday = new Date(at).getUTCDay();
    if (weekday !== 0 && weekday !== 6) days.push(new Date(at));
  }
  return days;
}
