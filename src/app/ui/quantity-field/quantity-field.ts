import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  inject,
  Injector,
  input,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import {
  type AbstractControl,
  type ControlValueAccessor,
  FormControl,
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  NgControl,
  ReactiveFormsModule,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { inDisplayUnit } from '#shared/quantities/display-unit';
import { parseReading } from '#shared/quantities/parse-reading';
import { DECIMAL_COMMA } from '../values/decimal-comma';
import { FieldErrorPipe } from '../values/field-error-pipe';

/**
 * A quantity as people write it, `35m`, `4k7` or `2.40`, with its unit always in view. The control's value is in SI base
 * units, null while the field is empty or not understood; what is not understood is told under the field.
 */
@Component({
  selector: 'qr-quantity-field',
  imports: [ReactiveFormsModule, MatFormFieldModule, MatInput, FieldErrorPipe],
  templateUrl: './quantity-field.html',
  styles: `
    :host {
      display: block;
    }
  `,
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: QuantityField, multi: true },
    { provide: NG_VALIDATORS, useExisting: QuantityField, multi: true },
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuantityField implements ControlValueAccessor, Validator {
  private readonly injector = inject(Injector);
  private readonly destroyed = inject(DestroyRef);

  readonly label = input.required<string>();
  /** The unit a bare number is in, and which is shown; empty for a plain number. */
  readonly unit = input.required<string>();
  /** Shown behind a plain number in a unit that takes no prefix, as min. */
  readonly shownUnit = input('');
  readonly hint = input('');
  readonly placeholder = input('');
  /** Whether the comma is the decimal sign; as people write at this browser unless given. */
  readonly decimalComma = input(DECIMAL_COMMA);

  protected readonly errors = signal<ValidationErrors | null>(null);
  protected readonly text = new FormControl('', { nonNullable: true, validators: () => this.errors() });

  private misunderstanding: ValidationErrors | null = null;
  private tell: (value: number | null) => void = () => undefined;
  protected touched: () => void = () => undefined;

  constructor() {
    this.text.valueChanges.pipe(takeUntilDestroyed()).subscribe((text) => this.read(text));
    afterNextRender(() => this.followControl());
  }

  writeValue(value: number | null): void {
    this.misunderstanding = null;
    const shown = value === null ? '' : String(inDisplayUnit(value, this.unit()));
    this.text.setValue(shown, { emitEvent: false });
  }

  registerOnChange(tell: (value: number | null) => void): void {
    this.tell = tell;
  }

  registerOnTouched(touched: () => void): void {
    this.touched = touched;
  }

  setDisabledState(disabled: boolean): void {
    if (disabled) this.text.disable({ emitEvent: false });
    else this.text.enable({ emitEvent: false });
  }

  validate(): ValidationErrors | null {
    return this.misunderstanding;
  }

  private read(text: string): void {
    this.misunderstanding = null;
    let value: number | null = null;
    if (text.trim() !== '') {
      try {
        value = parseReading(text, this.unit(), { decimalComma: this.decimalComma() });
      } catch (thrown) {
        if (!(thrown instanceof RangeError)) throw thrown;
        this.misunderstanding = { quantity: thrown.message };
      }
    }
    this.tell(value);
  }

  /** The inner input shows the errors of the control it stands for, whoever found them. */
  private followControl(): void {
    const control = this.injector.get(NgControl, null, { self: true, optional: true })?.control;
    if (!control) return;
    control.events.pipe(takeUntilDestroyed(this.destroyed)).subscribe(() => this.mirror(control));
    this.mirror(control);
  }

  private mirror(control: AbstractControl): void {
    this.errors.set(control.errors);
    this.text.updateValueAndValidity({ emitEvent: false });
    if (control.touched) this.text.markAsTouched();
    else this.text.markAsUntouched();
  }
}
