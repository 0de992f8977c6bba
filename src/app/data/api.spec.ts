import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { changeSite, readFront } from '#shared/contract/site';
import { listLots, readLot } from '#shared/contract/lots';
import { ApiClient, hrefOf } from './api';
import { type ApiProblem } from './api-problem';
import { Connection } from './connection';
import { problemInterceptor } from './problem-interceptor';

const settings = {
  name: 'Hollowmere Controls',
  department: 'Incoming 1',
  address: '',
  engineeringList: [],
  waitingTargetHours: 8,
  approveOwnPlans: false,
  releaseOwnReadings: false,
};

describe('ApiClient', () => {
  let http: HttpTestingController;
  let api: ApiClient;

  beforeEach(() => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(withInterceptors([problemInterceptor])), provideHttpClientTesting()],
    });
    http = TestBed.inject(HttpTestingController);
    api = TestBed.inject(ApiClient);
  });

  function problemOfFront(
    answer: (request: ReturnType<HttpTestingController['expectOne']>) => void,
  ): ApiProblem | undefined {
    let problem: ApiProblem | undefined;
    api.call(readFront, {}).subscribe({ error: (thrown: ApiProblem) => (problem = thrown) });
    answer(http.expectOne(readFront.path));
    return problem;
  }

  it('names the version that an edit starts from', () => {
    api.call(changeSite, { body: settings, version: 3 }).subscribe();
    const request = http.expectOne(changeSite.path).request;
    expect(request.method).toBe('PUT');
    expect(request.headers.get('If-Match')).toBe('"3"');
  });

  it('fills in the address and leaves out what is not given', () => {
    expect(hrefOf(readLot, { params: { id: 12 } })).toBe('/api/lots/12');
    expect(hrefOf(listLots, { query: { station: 'arrivals', after: undefined } })).toBe('/api/lots?station=arrivals');
  });

  it("passes the server's own sentence on", () => {
    const problem = problemOfFront((request) =>
      request.flush(
        { type: 'urn:x', title: 'The database is busy.', status: 503, code: 'busy' },
        { status: 503, statusText: 'Busy' },
      ),
    );
    expect(problem?.message).toBe('The database is busy.');
    expect(problem?.code).toBe('busy');
  });

  it('refuses an answer that has not the shape of the contract', () => {
    const problem = problemOfFront((request) => request.flush({ name: 1 }));
    expect(problem?.code).toBe('answer-not-understood');
    expect(problem?.message).toMatch(/Load the page again\.$/);
  });

  it('notes that the server cannot be reached, until it answers again', () => {
    const connection = TestBed.inject(Connection);
    expect(problemOfFront((request) => request.error(new ProgressEvent('error')))?.offline).toBe(true);
    expect(connection.lostSince()).not.toBeNull();
    problemOfFront((request) => request.flush({ name: 'S', mode: 'demo', version: '1', signIns: [] }));
    expect(connection.lostSince()).toBeNull();
  });
});
