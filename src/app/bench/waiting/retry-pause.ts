import { type ApiProblem } from '../../data/api-problem';

const FIRST = 1000;
const LONGEST = 30_000;

/** How long to wait before the server is tried again, in ms: twice as long each time, half a minute at most. */
export function retryPause(failures: number): number {
  return Math.min(FIRST * 2 ** Math.max(failures - 1, 0), LONGEST);
}

/**
 * What a failure means for the act that met it: the server is not there for anybody just now, it stumbled over this act and
 * may not the next time, or it refuses the act whatever the time.
 */
export function failureKind(problem: ApiProblem): 'unreachable' | 'stumbled' | 'refused' {
  if ([0, 401, 408, 425, 429, 502, 503, 504].includes(problem.status)) return 'unreachable';
  return problem.status >= 500 ? 'stumbled' : 'refused';
}
