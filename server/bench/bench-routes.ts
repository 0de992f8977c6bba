import { type Context } from '#server/context';
import { dayOf } from '#server/instruments/instrument-queries';
import { serve } from '#server/serve';
import * as contract from '#shared/contract/bench';
import { type Router } from 'express';
import { readBench } from './bench-queries';
import { reopenLot, setUnitAside, submitLot, withdrawReading } from './change-bench';
import { keepReading } from './keep-reading';
import { importRackFile, previewRackFile } from './rack-import';
import { RunningVerdicts } from '#server/judging/running-verdicts';

export function benchRoutes(router: Router, context: Context): void {
  const verdicts = new RunningVerdicts();
  const today = () => dayOf(context.clock.now());
  serve(router, contract.readBench, ({ params }) => readBench(context.db, params.id, today()));
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
