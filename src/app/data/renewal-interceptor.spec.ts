import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { of, Subject } from 'rxjs';
import { readFront } from '#shared/contract/site';
import { readMe, refreshSession, signIn } from '#shared/contract/session';
import { ApiClient } from './api';
import { type ApiProblem } from './api-problem';
import { problemInterceptor } from './problem-interceptor';
import { renewalInterceptor } from './renewal-interceptor';
import { SessionRenewal } from './session-renewal';

const me = {
  id: 7,
  name: 'I. Sandvær',
  email: 'inspector@hollowmere.example',
  stampNumber: '07',
  roles: ['inspector'],
};
const front = { name: 'Hollowmere Controls', mode: 'production', version: '1.0.0', signIns: [] };
const refused = (code = 'signed-out') => ({ type: 'urn:x', title: 'You are not signed in.', status: 401, code });
const signedOut = { status: 401, statusText: 'Unauthorized' };

/** Lets the promise behind a renewal come to its turn. */
const turn = () => new Promise((resolve) => setTimeout(resolve));

describe('a call after the session has run out', () => {
  let http: HttpTestingController;
  let api: ApiClient;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([problemInterceptor, renewalInterceptor])),
        provideHttpClientTesting(),
      ],
    });
    http = TestBed.inject(HttpTestingController);
    api = TestBed.inject(ApiClient);
  });

  afterEach(() => http.verify());

  it('renews the session once for all calls that wait, and is tried again', async () => {
    const answers: unknown[] = [];
    api.call(readMe, {}).subscribe((answer) => answers.push(answer));
    api.call(readFront, {}).subscribe((answer) => answers.push(answer));
    http.expectOne(readMe.path).flush(refused(), signedOut);
    http.expectOne(readFront.path).flush(refused(), signedOut);
    await turn();

    http.expectOne(refreshSession.path).flush(me);
    await turn();
    http.expectOne(readMe.path).flush(me);
    http.expectOne(readFront.path).flush(front);
    expect(answers).toEqual([me, front]);
  });

  it('asks the person to sign in again when it cannot be renewed, and then goes on', async () => {
    const again = new Subject<unknown>();
    TestBed.inject(SessionRenewal).signInAgain = () => again;
    let answer: unknown;
    api.call(readMe, {}).subscribe((reply) => (answer = reply));
    http.expectOne(readMe.path).flush(refused(), signedOut);
    await turn();
    http.expectOne(refreshSession.path).flush(refused('session-ended'), signedOut);
    await turn();

    again.next(me);
    again.complete();
    await turn();
    http.expectOne(readMe.path).flush(me);
    expect(answer).toEqual(me);
  });

  it('is not tried a third time', async () => {
    TestBed.inject(SessionRenewal).signInAgain = () => of(me);
    let problem: ApiProblem | undefined;
    api.call(readMe, {}).subscribe({ error: (thrown: ApiProblem) => (problem = thrown) });
    http.expectOne(readMe.path).flush(refused(), signedOut);
    await turn();
    http.expectOne(refreshSession.path).flush(me);
    await turn();
    http.expectOne(readMe.path).flush(refused(), signedOut);
    expect(problem?.status).toBe(401);
  });

  it('does not renew anything for a wrong password', () => {
    let problem: ApiProblem | undefined;
    api
      .call(signIn, { body: { email: me.email, password: 'not this one' } })
      .subscribe({ error: (thrown: ApiProblem) => (problem = thrown) });
    http.expectOne(signIn.path).flush(refused('sign-in-refused'), signedOut);
    expect(problem?.code).toBe('sign-in-refused');
  });
});
