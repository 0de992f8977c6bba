import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { FieldErrorPipe } from './values/field-error-pipe';

/** A password with a way to see what was typed. */
@Component({
  selector: 'qr-password-field',
  imports: [ReactiveFormsModule, MatFormFieldModule, MatInput, FieldErrorPipe],
  template: `
    <mat-form-field>
      <mat-label>{{ label() }}</mat-label>
      <input
        matInput
        [type]="shown() ? 'text' : 'password'"
        [formControl]="control()"
        [autocomplete]="autocomplete()"
        autocapitalize="none"
        spellcheck="false"
      />
      <button
        matSuffix
        type="button"
        [attr.aria-pressed]="shown()"
        [attr.aria-label]="shown() ? 'Hide what is typed' : 'Show what is typed'"
        (click)="shown.set(!shown())"
      >
        {{ shown() ? 'Hide' : 'Show' }}
      </button>
      @if (hint()) {
        <mat-hint>{{ hint() }}</mat-hint>
      }
      <mat-error>{{ control().errors | fieldError }}</mat-error>
    </mat-form-field>
  `,
  styles: `
    :host {
      display: block;
    }
    button {
      min-height: 28px;
      margin-right: 4px;
      padding: 0 8px;
      border: 0;
      border-radius: var(--qr-r-control);
      background: none;
      color: var(--qr-primary);
      font: var(--qr-t-label);
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordField {
  readonly label = input('Password');
  readonly control = input.required<FormControl<string>>();
  readonly autocomplete = input<'current-password' | 'new-password'>('current-password');
  readonly hint = input('');

  protected readonly shown = signal(false);
}
