import { readings } from '#db/schema/readings';
import { sampleUnits } from '#db/schema/lots';
import { record } from '#server/audit/record';
import { type Caller } from '#server/caller';
import { type Context } from '#server/context';
import { type RunningVerdicts } from '#server/judging/running-verdicts';
import { Conflict, NotFound } from '#server/problems';
import { type PlausibilityAnswer } from '#shared/contract/bench';
import { and, eq } from 'drizzle-orm';
import { onUnit } from './on-unit';

type Confirmation = Extract<PlausibilityAnswer, { answer: 'confirmed' }>;

/** Confirms a reading that a rack sent and that is far from what the part can give; the answer goes on record. */
export function answerQuestion(
  context: Context,
  verdicts: RunningVerdicts,
  caller: Caller,
  place: { lotId: number; readingId: string },
  given: Omit<Confirmation, 'answer'>,
) {
  return onUnit(context, verdicts, place.lotId, (tx, at) => {
    const found = tx
      .select({ reading: readings, unit: sampleUnits.unit })
      .from(readings)
      .innerJoin(sampleUnits, eq(sampleUnits.id, readings.unitId))
      .where(and(eq(readings.id, place.readingId), eq(readings.lotId, place.lotId)))
      .get();
    if (!found) throw new NotFound('This reading');
    const { question, withdrawnAt } = found.reading;
    if (question?.given.answer !== 'open' || withdrawnAt !== null)
      throw new Conflict('no-open-question', 'Nothing waits for an answer at this reading.');
    const answer = { answer: 'confirmed', ...given } as const;
    const answered = { ...question, given: answer, answeredBy: caller.name, answeredAt: at.toISOString() };
    tx.update(readings).set({ question: answered }).where(eq(readings.id, place.readingId)).run();
    record(tx, {
      at,
      person: caller,
      action: 'confirmed',
      subject: 'reading',
      subjectId: place.readingId,
      before: { question: 'open' },
      after: given,
    });
    return found.unit;
  });
}
