import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { type Me, signIn } from '#shared/contract/session';
import { ApiClient } from '../../data/api';
import { bySchema, showFaults } from '../../data/form-problems';
import { problemOf } from '../../data/api-problem';
import { formFieldDefaults } from '../../ui/material-defaults';
import { PasswordField } from '../../ui/password-field';
import { MessageNote } from '../../ui/states/message-note';

/** Asks the person, whose session ran out, for the password; what they were doing stays open underneath. */
@Component({
  selector: 'qr-sign-in-again',
  imports: [ReactiveFormsModule, MatButton, MatDialogModule, MessageNote, PasswordField],
  templateUrl: './sign-in-again.html',
  styles: `
    qr-password-field {
      margin-top: 12px;
    }
  `,
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInAgain {
  private readonly api = inject(ApiClient);
  private readonly dialog = inject<MatDialogRef<SignInAgain, Me>>(MatDialogRef);

  protected readonly me = inject<Me>(MAT_DIALOG_DATA);
  protected readonly form = inject(NonNullableFormBuilder).group({
    password: ['', bySchema(signIn.body.shape.password)],
  });
  protected readonly refusal = signal('');
  protected readonly busy = signal(false);

  protected submit(): void {
    this.form.markAllAsTouched();
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    const body = { email: this.me.email, password: this.form.getRawValue().password };
    this.api.call(signIn, { body }).subscribe({
      next: (me) => this.dialog.close(me),
      error: (thrown: unknown) => {
        this.busy.set(false);
        this.refusal.set(showFaults(this.form, problemOf(thrown)).join(' '));
      },
    });
  }

  protected giveUp(): void {
    this.dialog.close();
  }
}
