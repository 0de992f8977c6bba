import { type Context } from '#server/context';
import { remindDue } from './remind-due';

/** A reminder comes at most this long after its day has begun. */
const HOUR = 60 * 60 * 1000;

/** Looks for calibrations that fall due now and every hour from now on. @returns how to stop it */
export function startReminders(context: Context): () => void {
  const run = () => {
    try {
      if (remindDue(context) > 0) context.outbox.wake();
    } catch (error) {
      context.log.error({ err: error }, 'reminders of calibrations could not be written');
    }
  };
  run();
  const timer = setInterval(run, HOUR);
  timer.unref();
  return () => clearInterval(timer);
}
