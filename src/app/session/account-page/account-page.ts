import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { ROLE_TITLES } from '#shared/contract/roles';
import { changePassword } from '#shared/contract/session';
import { ApiClient } from '../../data/api';
import { problemOf } from '../../data/api-problem';
import { bySchema, showFaults } from '../../data/form-problems';
import { PasswordField } from '../../ui/password-field';
import { MessageNote } from '../../ui/states/message-note';
import { Session } from '../session';

/** The person's own account: who the site takes them for, and a new password. */
@Component({
  selector: 'qr-account-page',
  imports: [ReactiveFormsModule, MatButton, MessageNote, PasswordField],
  templateUrl: './account-page.html',
  styles: `
    .columns {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(280px, 400px));
      gap: 16px;
      align-items: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountPage {
  private readonly api = inject(ApiClient);
  private readonly snackBar = inject(MatSnackBar);
  private readonly session = inject(Session);

  protected readonly me = this.session.me;
  protected readonly roles = computed(() =>
    this.me()
      ?.roles.map((role) => ROLE_TITLES[role])
      .join(', '),
  );
  protected readonly refusal = signal('');
  protected readonly busy = signal(false);
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: ['', bySchema(changePassword.body.shape.password)],
    newPassword: ['', bySchema(changePassword.body.shape.newPassword)],
  });

  protected change(): void {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    this.refusal.set('');
    this.api.call(changePassword, { body: this.form.getRawValue() }).subscribe({
      next: () => {
        this.busy.set(false);
        this.form.reset();
        this.snackBar.open('Password changed. Your other sessions have ended.');
      },
      error: (thrown: unknown) => {
        this.busy.set(false);
        this.refusal.set(showFaults(this.form, problemOf(thrown)).join(' '));
      },
    });
  }

  protected signOut(): void {
    this.session.signOut().subscribe({
      error: (thrown: unknown) => this.refusal.set(problemOf(thrown).message),
    });
  }
}
