import compression from 'compression';
import cookieParser from 'cookie-parser';
import express, { Router, type Express, type RequestHandler } from 'express';
import { auditRoutes } from './audit/audit-routes';
import { type Context } from './context';
import { countRoutes } from './counts/count-routes';
import { descriptionRoutes } from './description/description-routes';
import { eventRoutes } from './events/event-routes';
import { benchRoutes } from './bench/bench-routes';
import { budgetRoutes } from './budgets/budget-routes';
import { calibrationRoutes } from './calibrations/calibration-routes';
import { certificateRoutes } from './certificates/certificate-routes';
import { decisionRoutes } from './decision/decision-routes';
import { gaugeStudyRoutes } from './gauge-studies/gauge-study-routes';
import { instrumentRoutes } from './instruments/instrument-routes';
import { lotRoutes } from './lots/lot-routes';
import { mailRoutes } from './mail/mail-routes';
import { nonconformanceRoutes } from './nonconformances/nonconformance-routes';
import { partRoutes } from './parts/part-routes';
import { peopleRoutes } from './people/people-routes';
import { planRoutes } from './plans/plan-routes';
import { waveformRoutes } from './waveforms/waveform-routes';
import { yieldRoutes } from './yields/yield-routes';
import { reviewRoutes } from './reviews/review-routes';
import { rackRoutes } from './racks/rack-routes';
import { attachRack } from './racks/attach-rack';
import { RunningVerdicts } from './judging/running-verdicts';
import { problemHandler } from './problem-handler';
import { NotFound, Problem } from './problems';
import { searchRoutes } from './search/search-routes';
import { attachCaller } from './sessions/attach-caller';
import { sessionRoutes } from './sessions/session-routes';
import { siteRoutes } from './site/site-routes';
import { supplierRoutes } from './suppliers/supplier-routes';
import { announceChanges } from './web/announce-changes';
import { healthRoute } from './web/health-route';
import { jsonBody } from './web/json-body';
import { originCheck } from './web/origin-check';
import { requestLog } from './web/request-log';
import { securityHeaders } from './web/security-headers';
import { staticApp } from './web/static-app';

const AREAS: readonly ((router: Router, context: Context, verdicts: RunningVerdicts) => void)[] = [
  sessionRoutes,
  siteRoutes,
  peopleRoutes,
  countRoutes,
  eventRoutes,
  searchRoutes,
  supplierRoutes,
  partRoutes,
  planRoutes,
  instrumentRoutes,
  calibrationRoutes,
  reviewRoutes,
  gaugeStudyRoutes,
  lotRoutes,
  benchRoutes,
  budgetRoutes,
  waveformRoutes,
  rackRoutes,
  decisionRoutes,
  certificateRoutes,
  nonconformanceRoutes,
  yieldRoutes,
  mailRoutes,
  auditRoutes,
  descriptionRoutes,
];

/** An answer is as old as the moment it was given: its version tag names an edit, not everything it shows. */
const neverCached: RequestHandler = (_request, response, next) => {
  response.set('cache-control', 'no-store');
  next();
};

const noSuchEndpoint: RequestHandler = (_request, _response, next) => {
  next(new Problem(404, 'no-such-endpoint', 'This interface has no such endpoint.'));
};

const nothingHere: RequestHandler = (_request, _response, next) => {
  next(new NotFound('This address'));
};

/** Events are sent as they happen, not when a compressor has enough of them. */
const compressed = compression({
  filter: (request, response) =>
    !String(response.getHeader('content-type')).startsWith('text/event-stream') &&
    compression.filter(request, response),
});

/** The application behind one port: interface, live counts and the browser's files. It does not listen. */
export function createApp(context: Context): Express {
  const { environment, log, stream } = context;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', environment.trustProxy);
  app.use(requestLog(log), securityHeaders(environment), compressed);

  app.use('/api', neverCached, originCheck(environment), cookieParser());
  app.use('/api', attachCaller(context), attachRack(context), jsonBody());
  app.use('/api', announceChanges(stream));
  const router = Router();
  const verdicts = new RunningVerdicts();
  for (const area of AREAS) area(router, context, verdicts);
  app.use(router);
  app.use('/api', noSuchEndpoint);

  app.get('/health', healthRoute(context));
  app.use(staticApp(environment.root), nothingHere);
  app.use(problemHandler(log));
  return app;
}
