import { demoGaugeStudy, unfinished } from '#db/demo/gauge-study';
import { type Quarter } from '#db/demo/quarter';
import { type Context } from '#server/context';
import { addGaugeStudy, changeGaugeStudy, closeGaugeStudy } from '#server/gauge-studies/keep-gauge-study';
import { type Agenda } from './agenda';
import { type Cast } from './cast';
import { type DemoClock } from './demo-clock';
import { type Stage } from './stage';

const DAY = 86_400_000;
/** Units that the last person of the open study has measured. */
const MEASURED_SO_FAR = 6;

function instrumentOf({ instruments }: Stage, assetNumber: string): number {
  const found = instruments.find((one) => one.assetNumber === assetNumber);
  if (!found) throw new Error(`The demo has no ${assetNumber}.`);
  return found.id;
}

/** Puts the gauge studies on the agenda: one of the multimeter that is closed, one of the oscilloscope still being measured. */
export function addStudySteps(
  context: Context,
  clock: DemoClock,
  agenda: Agenda,
  { cast, stage, quarter, seed }: { cast: Cast; stage: Stage; quarter: Quarter; seed: number },
): void {
  const [first, second] = cast.quality;
  const persons = [...cast.inspectors, first].map(({ name }) => name);
  const meter = demoGaugeStudy('meter', { instrumentId: instrumentOf(stage, 'DM-11'), persons, seed });
  const scope = demoGaugeStudy('scope', { instrumentId: instrumentOf(stage, 'OS-03'), persons, seed: seed + 1 });
  agenda.add(new Date(quarter.revisedAt.getTime() - DAY), () => {
    const empty = addGaugeStudy(context, first, unfinished(meter, 0));
    clock.advance(7200);
    const { id, version } = changeGaugeStudy(context, first, { ...empty, body: meter });
    clock.advance(300);
    closeGaugeStudy(context, first, { id, version });
  });
  agenda.add(quarter.lastAfternoon, () => {
    clock.advance(600);
    addGaugeStudy(context, second, unfinished(scope, MEASURED_SO_FAR));
  });
}
