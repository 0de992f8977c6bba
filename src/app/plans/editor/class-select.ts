import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { NONCONFORMITY_CLASSES, type NonconformityClass } from '#shared/sampling/scheme';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';

/** The class of a nonconformity, chosen by its bars and name. */
@Component({
  selector: 'qr-class-select',
  imports: [ClassGlyph, FieldErrorPipe, MatFormFieldModule, MatSelectModule, ReactiveFormsModule],
  template: `
    <mat-form-field>
      <mat-label>Class</mat-label>
      <mat-select [formControl]="control()">
        <mat-select-trigger><qr-class-glyph [of]="control().value" /></mat-select-trigger>
        @for (name of classes; track name) {
          <mat-option [value]="name"><qr-class-glyph [of]="name" /></mat-option>
        }
      </mat-select>
      <mat-error>{{ control().errors | fieldError }}</mat-error>
    </mat-form-field>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClassSelect {
  readonly control = input.required<FormControl<NonconformityClass>>();

  protected readonly classes = NONCONFORMITY_CLASSES;
}
