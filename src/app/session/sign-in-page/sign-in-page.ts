import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import { signIn } from '#shared/contract/session';
import { readFront, type Front } from '#shared/contract/site';
import { endpointResource } from '../../data/api';
import { problemOf } from '../../data/api-problem';
import { bySchema, showFaults } from '../../data/form-problems';
import { PasswordField } from '../../ui/password-field';
import { MessageNote } from '../../ui/states/message-note';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { FrontFooter } from '../front-footer/front-footer';
import { FrontRipple } from '../front-ripple';
import { Session } from '../session';
import { DemoSignIns } from './demo-sign-ins';

/** Where a person says who they are; afterwards they come to the address they wanted. */
@Component({
  selector: 'qr-sign-in-page',
  imports: [
    ReactiveFormsModule,
    MatButton,
    MatFormFieldModule,
    MatInput,
    DemoSignIns,
    FieldErrorPipe,
    FrontFooter,
    FrontRipple,
    MessageNote,
    PasswordField,
  ],
  templateUrl: './sign-in-page.html',
  styleUrl: '../front.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly session = inject(Session);
  private readonly router = inject(Router);

  /** The address to go to afterwards. */
  readonly back = input<string>();

  protected readonly front = endpointResource(readFront, () => ({}));
  protected readonly signIns = computed(() => (this.front.hasValue() ? this.front.value().signIns : []));
  protected readonly refusal = signal('');
  protected readonly busy = signal(false);
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: ['', bySchema(signIn.body.shape.email)],
    password: ['', bySchema(signIn.body.shape.password)],
    keep: [false],
  });

  protected fill({ email, password }: Front['signIns'][number]): void {
    this.form.patchValue({ email, password });
    this.refusal.set('');
  }

  protected submit(): void {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    this.refusal.set('');
    this.session.signIn(this.form.getRawValue()).subscribe({
      next: () => void this.router.navigateByUrl(this.back() ?? '/', { replaceUrl: true }),
      error: (thrown: unknown) => {
        this.busy.set(false);
        this.refusal.set(showFaults(this.form, problemOf(thrown)).join(' '));
      },
    });
  }
}
