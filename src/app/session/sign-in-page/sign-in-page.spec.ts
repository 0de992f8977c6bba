import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { Component, ChangeDetectionStrategy } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { signIn } from '#shared/contract/session';
import { readFront } from '#shared/contract/site';
import { problemInterceptor } from '../../data/problem-interceptor';
import { SignInPage } from './sign-in-page';

@Component({ selector: 'qr-somewhere', template: 'somewhere', changeDetection: ChangeDetectionStrategy.OnPush })
class Somewhere {}

const person = {
  name: 'I. Sandvær',
  roles: ['inspector'],
  email: 'inspector@hollowmere.example',
  password: 'calm rail',
};
const front = { name: 'Hollowmere Controls', mode: 'demo', version: '1.0.0', signIns: [person] };

async function open() {
  TestBed.configureTestingModule({
    providers: [
      provideRouter(
        [
          { path: 'sign-in', component: SignInPage },
          { path: '**', component: Somewhere },
        ],
        withComponentInputBinding(),
      ),
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
  const harness = await RouterTestingHarness.create();
  const opened = harness.navigateByUrl('/sign-in?back=%2Fbench%2F12');
  await opened;
  const http = TestBed.inject(HttpTestingController);
  harness.detectChanges();
  http.expectOne(readFront.path).flush(front);
  await harness.fixture.whenStable();
  const element = harness.fixture.nativeElement as HTMLElement;
  const press = async (text: string) => {
    [...element.querySelectorAll('button')].find((button) => button.textContent.includes(text))?.click();
    await harness.fixture.whenStable();
  };
  return { harness, http, element, press };
}

describe('SignInPage', () => {
  it('says what is missing before it asks the server', async () => {
    const { element, http, press } = await open();
    await press('Sign in');
    http.expectNone(signIn.path);
    expect(element.textContent).toContain('This is not an e-mail address.');
    expect(element.textContent).toContain('Type the password.');
  });

  it('fills both fields for a person of the demo', async () => {
    const { element, press } = await open();
    await press(person.name);
    expect(element.querySelector<HTMLInputElement>('#email')?.value).toBe(person.email);
    expect(element.querySelector<HTMLInputElement>('#password')?.value).toBe(person.password);
  });

  it("shows the server's refusal and lets the person try again", async () => {
    const { element, http, harness, press } = await open();
    await press(person.name);
    await press('Sign in');
    const title = 'Too many attempts. Wait a quarter of an hour, then try again.';
    http
      .expectOne(signIn.path)
      .flush({ type: 'urn:x', title, status: 429, code: 'too-many-attempts' }, { status: 429, statusText: 'Too many' });
    await harness.fixture.whenStable();
    expect(element.textContent).toContain(title);
    expect(element.querySelector<HTMLButtonElement>('.submit')?.disabled).toBe(false);
  });

  it('goes to the address that was wanted', async () => {
    const { http, harness, press } = await open();
    await press(person.name);
    await press('Sign in');
    const { name, email, roles } = person;
    http.expectOne(signIn.path).flush({ id: 7, name, email, roles, stampNumber: '07' });
    await harness.fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe('/bench/12');
  });
});
