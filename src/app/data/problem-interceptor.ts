import { HttpResponse, type HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, tap, throwError } from 'rxjs';
import { problemOf } from './api-problem';
import { Connection } from './connection';

/** Turns every failed answer into an `ApiProblem`, so that pages know one kind of failure, and notes whether the server answers. */
export const problemInterceptor: HttpInterceptorFn = (request, next) => {
  const connection = inject(Connection);
  return next(request).pipe(
    tap((event) => {
      if (event instanceof HttpResponse) connection.answered();
    }),
    catchError((thrown: unknown) => {
      const problem = problemOf(thrown);
      if (problem.offline) connection.unanswered();
      else connection.answered();
      return throwError(() => problem);
    }),
  );
};
