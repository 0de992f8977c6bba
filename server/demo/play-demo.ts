import { type DemoSpan, quarterOf } from '#db/demo/quarter';
import { type Context } from '#server/context';
import { RunningVerdicts } from '#server/judging/running-verdicts';
import { Agenda } from './agenda';
import { addCalibrationSteps } from './calibration-steps';
import { addCast } from './cast';
import { DemoClock } from './demo-clock';
import { startDemoMail } from './demo-mail';
import { LotPlay } from './lot-play';
import { addPlanSteps } from './plan-steps';
import { rememberedPasswords } from './remembered-passwords';
import { setStage } from './stage';
import { addStudySteps } from './study-steps';

const WEEKS = 13;
/** With the quarter they make a year. */
const WEEKS_BEFORE = 39;

/** How long a notice is on its way, in seconds. */
const MAIL_SECONDS = 4;

async function playQuarter(context: Context, clock: DemoClock, span: DemoSpan): Promise<void> {
  const { until, seed } = span;
  const quarter = quarterOf(span);
  const agenda = new Agenda(clock);
  clock.set(quarter.firstMorning);
  const cast = await addCast(context);
  const stage = setStage(context, clock, cast, until);
  addPlanSteps(context, clock, agenda, { cast, stage, quarter });
  addCalibrationSteps(context, agenda, { cast, instruments: stage.instruments, until, seed });
  addStudySteps(context, clock, agenda, { cast, stage, quarter, seed });
  const verdicts = new RunningVerdicts();
  const noticesSent = async () => {
    clock.advance(MAIL_SECONDS);
    await context.outbox.idle();
  };
  for (const lot of quarter.lots) new LotPlay({ context, verdicts, agenda, cast, stage, noticesSent }, lot);
  await agenda.play(until);
}

/**
 * Fills an empty database with the weeks up to a moment: an invented maker, its suppliers and their lots, booked in, drawn,
 * measured, judged and signed through the program's own acts, on a clock of its own.
 */
export async function playDemo(
  context: Context,
  { until, seed, weeks = WEEKS, weeksBefore = WEEKS_BEFORE }: Omit<DemoSpan, 'weeks'> & { weeks?: number },
): Promise<void> {
  const clock = new DemoClock();
  const outbox = await startDemoMail(context, clock);
  try {
    const passwords = rememberedPasswords(context.passwords);
    await playQuarter({ ...context, clock, outbox, passwords }, clock, { until, seed, weeks, weeksBefore });
  } finally {
    await outbox.close();
  }
}
