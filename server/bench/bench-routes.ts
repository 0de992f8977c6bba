import { type Context } from '#server/context';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/bench';
import * as conditions from '#shared/contract/conditions';
import { type Router } from 'express';
import { answerQuestion } from './answer-question';
import { readBenchChanges } from './bench-changes';
import { readBench } from './bench-queries';
import { reopenLot, setUnitAside, submitLot, withdrawReading } from './change-bench';
import { keepReading } from './keep-reading';
import { noteConditions } from './lot-conditions';
import { importRackFile, previewRackFile } from './rack-import';
import { ruleOnUnit } from './rule-on-unit';
import { type RunningVerdicts } from '#server/judging/running-verdicts';

export function benchRoutes(router: Router, context: Context, verdicts: RunningVerdicts): void {
  const { db, clock } = context;
  serve(router, contract.readBench, ({ params }) => readBench(db, params.id, clock.now()));
  serve(router, contract.readBenchChanges, ({ params, query }) =>
    readBenchChanges(db, params.id, query.since, clock.now()),
  );
  serve(router, conditions.noteConditions, ({ caller, params, body }) =>
    noteConditions(context, caller, params.id, body),
  );
  serve(router, contract.answerQuestion, ({ caller, params, body }) =>
    answerQuestion(context, verdicts, caller, { lotId: params.id, readingId: params.reading }, body),
  );
  serve(router, contract.ruleOnUnit, ({ caller, params, body }) =>
    ruleOnUnit(context, verdicts, caller, { lotId: params.id, unit: params.unit }, body),
  );
  serve(router, contract.keepReading, ({ caller, params, body }) =>
    keepReading(context, verdicts, caller, params.id, params.reading, body),
  );
  serve(router, contract.withdrawReading, ({ caller, params }) =>
    withdrawReading(context, verdicts, caller, params.id, params.reading),
  );
  serve(router, contract.setUnitAside, ({ caller, params, body }) =>
    setUnitAside(context, verdicts, caller, params.id, params.unit, body.reason),
  );
  serve(router, contract.submitLot, ({ caller, params, version }) =>
    submitLot(context, verdicts, caller, params.id, version),
  );
  serve(router, contract.reopenLot, ({ caller, params, version, body }) =>
    reopenLot(context, caller, params.id, version, body.reason),
  );
  serve(router, contract.previewRackFile, ({ params, body }) => previewRackFile(context, params.id, body));
  serve(router, contract.importRackFile, ({ caller, params, body }) =>
    importRackFile(context, verdicts, caller, params.id, body),
  );
}
