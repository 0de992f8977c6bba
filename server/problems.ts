import { type Fault } from '#shared/contract/problem';

/**
 * A refusal that the caller is told about as RFC 9457 problem details: status, a stable code, a sentence, and for input
 * the path of each fault. 400: it has not the shape; 422: a rule of the trade refuses it; 409: the state does.
 */
export class Problem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    readonly title: string,
    readonly errors: readonly Fault[] = [],
  ) {
    super(title);
  }
}

export class NotFound extends Problem {
  constructor(what: string) {
    super(404, 'not-found', `${what} does not exist.`);
  }
}

/** A rule of the trade refuses the input; each fault names its field. */
export class Refused extends Problem {
  constructor(code: string, title: string, errors: readonly Fault[] = []) {
    super(422, code, title, errors);
  }
}

/** The thing is not in the state that the act needs. */
export class Conflict extends Problem {
  constructor(code: string, title: string) {
    super(409, code, title);
  }
}

export class Forbidden extends Problem {
  constructor(title: string, code = 'forbidden') {
    super(403, code, title);
  }
}

export class Unauthenticated extends Problem {
  constructor(code = 'signed-out', title = 'You are not signed in.') {
    super(401, code, title);
  }
}

/** Somebody else changed the thing first. */
export class LostRace extends Problem {
  constructor(what: string) {
    super(412, 'changed-meanwhile', `${what} was changed by somebody else since you opened it.`);
  }
}

/** Refuses an edit of any version but the current one. */
export function holdVersion(what: string, current: number, named: number): void {
  if (current !== named) throw new LostRace(what);
}
