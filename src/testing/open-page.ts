import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { inputBinding, type Type } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { type Role } from '#shared/contract/roles';
import { problemInterceptor } from '../app/data/problem-interceptor';
import { Session } from '../app/session/session';
import { materialDefaults } from '../app/ui/material-defaults';

/** A page that is open for somebody, and the server's side of it. */
export interface OpenPage<Page> {
  readonly fixture: ComponentFixture<Page>;
  readonly http: HttpTestingController;
  readonly element: HTMLElement;
  /** What can be read on the page, white space made single. */
  text(): string;
  /** Answers the one open request to an address. */
  answer(url: string, body: object | null, status?: number): Promise<void>;
  /** Types into the field under a label. */
  type(label: string, text: string): Promise<void>;
  press(button: string): Promise<void>;
}

/** Opens a page for a person with the given roles; `inputs` are what its route would give. */
export async function openPage<Page>(
  page: Type<Page>,
  roles: readonly Role[],
  inputs: Readonly<Record<string, unknown>> = {},
): Promise<OpenPage<Page>> {
  TestBed.configureTestingModule({
    imports: [page],
    providers: [
      provideRouter([]),
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
      materialDefaults,
    ],
  });
  // What a page defers is known only once it is compiled.
  await TestBed.compileComponents();
  const http = TestBed.inject(HttpTestingController);
  TestBed.inject(Session).restore().subscribe();
  http
    .expectOne('/api/session')
    .flush({ id: 1, name: 'M. Aldoush', email: 'quality@hollowmere.example', stampNumber: '02', roles });
  const bindings = Object.entries(inputs).map(([name, value]) => inputBinding(name, () => value));
  const fixture = TestBed.createComponent(page, { bindings });
  const element = fixture.nativeElement as HTMLElement;
  const settle = async () => {
    TestBed.tick();
    await new Promise((done) => setTimeout(done));
    TestBed.tick();
  };
  await settle();
  return {
    fixture,
    http,
    element,
    text: () => wordsOf(element),
    answer: async (url, body, status = 200) => {
      const request = http.expectOne((open) => open.urlWithParams === url);
      request.flush(body, { status, statusText: String(status) });
      await settle();
    },
    type: async (label, text) => {
      const field = fieldOf(element, label);
      field.value = text;
      field.dispatchEvent(new Event('input'));
      field.dispatchEvent(new Event('blur'));
      await settle();
    },
    press: async (name) => {
      buttonOf(element, name).click();
      await settle();
    },
  };
}

/** What a refusing server sends. */
export function problem(status: number, title: string, errors: readonly object[] = []) {
  return { type: 'about:blank', title, status, code: 'refused', errors };
}

/** All text, with a space between one element's and the next one's. */
function wordsOf(element: HTMLElement): string {
  const walker = document.createTreeWalker(element, NodeFilter.SHOW_TEXT);
  const words: string[] = [];
  while (walker.nextNode() !== null) words.push(walker.currentNode.textContent ?? '');
  return words.join(' ').replace(/\s+/g, ' ').trim();
}

function fieldOf(element: HTMLElement, label: string): HTMLInputElement {
  const field = [...element.querySelectorAll('mat-form-field')].find(
    (each) => each.querySelector('label')?.textContent?.trim() === label,
  );
  const input = field?.querySelector<HTMLInputElement>('input, textarea');
  if (!input) throw new Error(`There is no field "${label}".`);
  return input;
}

function buttonOf(element: HTMLElement, name: string): HTMLElement {
  const button = [...element.querySelectorAll('button')].find((each) => each.textContent?.trim() === name);
  if (!button) throw new Error(`There is no button "${name}".`);
  return button;
}
