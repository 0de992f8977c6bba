import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { map, startWith, switchMap } from 'rxjs';
import { Icon } from '../../ui/marks/icon';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { pointError } from '../calibration/point-error';
import { POINT_UNITS, type PointGroup } from './calibration-fields';

/** One point of a calibration as it is typed, with how far off the instrument was. */
@Component({
  selector: 'qr-point-row',
  imports: [
    FieldErrorPipe,
    Icon,
    MatButtonModule,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    QuantityField,
    ReactiveFormsModule,
    VerdictMark,
  ],
  templateUrl: './point-row.html',
  styleUrl: './point-row.scss',
  host: { role: 'group', '[attr.aria-label]': '"Point " + number()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PointRow {
  readonly point = input.required<PointGroup>();
  readonly number = input.required<number>();
  readonly removed = output();

  protected readonly units = POINT_UNITS;
  private readonly typed = toSignal(
    toObservable(this.point).pipe(
      switchMap((group) =>
        group.events.pipe(
          startWith(null),
          map(() => group.getRawValue()),
        ),
      ),
    ),
  );
  protected readonly unit = computed(() => this.typed()?.unit ?? this.point().controls.unit.value);
  protected readonly error = computed(() => {
    const typed = this.typed();
    if (typed === undefined) return null;
    const { reference, found, limit, unit } = typed;
    if (reference === null || found === null || limit === null) return null;
    return pointError({ reference, found, limit, unit });
  });
}
