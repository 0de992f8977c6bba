import { type Db } from '#db/open-database';
import { calibrationReminders } from '#db/schema/calibrations';
import { people, personRoles } from '#db/schema/people';
import { type Context } from '#server/context';
import { dayOf, listInstruments } from '#server/instruments/instrument-queries';
import { calibrationReminder } from '#server/mail/calibration-reminder';
import { queueMessage } from '#server/mail/queue-message';
import { findSite } from '#server/site/site-queries';
import { type Instrument } from '#shared/contract/instruments';
import { and, asc, eq } from 'drizzle-orm';

/**
 * Days before the due date at which quality is reminded, and once when it has passed: a month is what a laboratory takes
 * (common practice, no source).
 */
const STEPS = [30, 7, -1] as const;

type Reminded = Pick<Instrument, 'id' | 'calibrationDue' | 'daysLeft'>;

function isSent(db: Db, { id, calibrationDue }: Reminded, days: number): boolean {
  const of = and(
    eq(calibrationReminders.instrumentId, id),
    eq(calibrationReminders.dueOn, calibrationDue),
    eq(calibrationReminders.days, days),
  );
  return db.select().from(calibrationReminders).where(of).get() !== undefined;
}

/** The latest step that an instrument has come to and was not reminded of. */
function stepOf(db: Db, instrument: Reminded): number | undefined {
  const reached = STEPS.filter((days) => instrument.daysLeft <= days).at(-1);
  return reached === undefined || isSent(db, instrument, reached) ? undefined : reached;
}

function qualityAddresses(db: Db): string[] {
  return db
    .select({ email: people.email })
    .from(people)
    .innerJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(people.active, true), eq(personRoles.role, 'quality')))
    .orderBy(asc(people.email))
    .all()
    .map(({ email }) => email);
}

/**
 * Reminds quality of the calibrations that fall due, each step once: in one letter, what has passed its date first. Run
 * as often as one likes.
 *
 * @returns how many instruments the letter names; 0 where there was none to send
 */
export function remindDue({ db, clock, environment }: Context): number {
  const at = clock.now();
  return db.transaction((tx) => {
    const due = listInstruments(tx, dayOf(at))
      .filter(({ status }) => status === 'in-service')
      .flatMap((instrument) => {
        const days = stepOf(tx, instrument);
        return days === undefined ? [] : [{ instrument, days }];
      });
    const to = qualityAddresses(tx);
    if (due.length === 0 || to.length === 0) return 0;
    for (const { instrument, days } of due)
      tx.insert(calibrationReminders)
        .values({ instrumentId: instrument.id, dueOn: instrument.calibrationDue, days, sentAt: at.toISOString() })
        .run();
    const { name, department } = findSite(tx);
    const link = environment.publicUrl === undefined ? null : new URL('/instruments', environment.publicUrl).toString();
    const instruments = due.map(({ instrument }) => instrument);
    const letter = calibrationReminder({ siteName: name, department, at: at.toISOString(), instruments, link });
    queueMessage(tx, { event: 'calibration-due', to, ...letter, at });
    return due.length;
  });
}
