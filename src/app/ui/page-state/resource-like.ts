import { type ResourceStatus, type Signal } from '@angular/core';

/** What the state pieces need of a resource: Angular's own resources have it, and so may a test's plain object. */
export interface ResourceLike<T> {
  readonly value: Signal<T>;
  readonly status: Signal<ResourceStatus>;
  readonly error: Signal<Error | undefined>;
  hasValue(): boolean;
  reload(): boolean;
}

/** What the state pieces read of a failure; a server's problem details have all of it. */
export interface Failure {
  readonly status: number;
  readonly message: string;
  readonly code?: string;
  readonly at?: Date;
}

/** Whatever failed, as far as it can be told. */
export function failureOf(error: Error): Failure {
  const stated = error as Error & Partial<Omit<Failure, 'message'>>;
  return { status: stated.status ?? -1, message: error.message, code: stated.code, at: stated.at };
}
