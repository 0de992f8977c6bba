import { ChangeDetectionStrategy, Component, computed, DOCUMENT, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { type Observable } from 'rxjs';
import { openSite, readOneTimeLink, setPassword } from '#shared/contract/session';
import { readFront } from '#shared/contract/site';
import { ApiClient, endpointResource, type Reply } from '../../data/api';
import { type ApiProblem, problemOf } from '../../data/api-problem';
import { bySchema, showFaults } from '../../data/form-problems';
import { formFieldDefaults } from '../../ui/material-defaults';
import { PasswordField } from '../../ui/password-field';
import { MessageNote } from '../../ui/states/message-note';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { FrontFooter } from '../front-footer/front-footer';
import { FrontRipple } from '../front-ripple';

const { name, email, newPassword } = openSite.body.shape;

/** What a one-time link opens: setting the site up as its first administrator, or setting a password. */
@Component({
  selector: 'qr-link-page',
  imports: [
    ReactiveFormsModule,
    RouterLink,
    MatButton,
    MatFormFieldModule,
    MatInput,
    FieldErrorPipe,
    FrontFooter,
    FrontRipple,
    MessageNote,
    PasswordField,
  ],
  templateUrl: './link-page.html',
  styleUrl: '../front.scss',
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LinkPage {
  private readonly api = inject(ApiClient);
  /** The token stands behind the # so that it is in no server's log. */
  private readonly token = inject(DOCUMENT).location.hash.slice(1);

  protected readonly front = endpointResource(readFront, () => ({}));
  protected readonly link = signal<Reply<typeof readOneTimeLink> | null>(null);
  protected readonly refusal = signal('');
  protected readonly busy = signal(false);
  protected readonly finished = signal(false);
  protected readonly firstAdmin = computed(() => this.link()?.purpose === 'first-admin');
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', bySchema(name)],
    email: ['', bySchema(email)],
    newPassword: ['', bySchema(newPassword)],
  });

  constructor() {
    this.read();
  }

  protected submit(): void {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    this.refusal.set('');
    this.send().subscribe({
      next: () => this.finished.set(true),
      error: (thrown: unknown) => {
        this.busy.set(false);
        this.refusal.set(showFaults(this.form, problemOf(thrown)).join(' '));
      },
    });
  }

  private send(): Observable<unknown> {
    const { token } = this;
    const typed = this.form.getRawValue();
    return this.firstAdmin()
      ? this.api.call(openSite, { body: { token, ...typed } })
      : this.api.call(setPassword, { body: { token, newPassword: typed.newPassword } });
  }

  private read(): void {
    this.api.call(readOneTimeLink, { body: { token: this.token } }).subscribe({
      next: (link) => {
        this.link.set(link);
        if (link.purpose === 'first-admin') return;
        this.form.controls.name.disable();
        this.form.controls.email.disable();
      },
      error: (problem: ApiProblem) => this.refusal.set(refusalOf(problem)),
    });
  }
}

/** A token without the shape of one is a link that was cut short. */
function refusalOf(problem: ApiProblem): string {
  return problem.status === 400 ? 'This link is not complete. Copy it whole.' : problem.message;
}
