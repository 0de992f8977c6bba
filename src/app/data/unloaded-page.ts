import { inject } from '@angular/core';
import { type NavigationError } from '@angular/router';
import { Connection } from './connection';

/** What browsers say, each in its words, when a part of the application cannot be fetched. */
const NOT_FETCHED = /dynamically imported module|importing a module script/i;

/** A page whose code could not be fetched: the person stays where they are, and the shell says that the connection is gone. */
export function noteUnloadedPage({ error }: NavigationError): void {
  if (error instanceof Error && NOT_FETCHED.test(error.message)) inject(Connection).unanswered();
}
