import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  Injector,
  input,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Icon } from '../../ui/marks/icon';
import { type CalibrationFields } from './calibration-fields';
import { PointRow } from './point-row';

/** The points of a calibration, row by row. */
@Component({
  selector: 'qr-points-field',
  imports: [Icon, MatButton, PointRow],
  template: `
    <fieldset>
      <legend>Points, as found</legend>
      <p class="small quiet">
        What was applied and what the instrument showed before any adjustment. A review measures doubtful readings by
        the largest error of the same unit.
      </p>
      @for (row of fields().rows(); track row) {
        <qr-point-row [point]="row" [number]="$index + 1" (removed)="remove($index)" />
      }
      <div>
        <button type="button" class="add" matButton="outlined" (click)="add()">
          <qr-icon name="plus" [size]="18" />Add point
        </button>
      </div>
    </fieldset>
  `,
  styles: `
    fieldset {
      display: grid;
      gap: 10px;
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0;
      font: var(--qr-t-title);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PointsField {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  readonly fields = input.required<CalibrationFields>();
  /** Unit of the first point. */
  readonly usualUnit = input('V');

  protected add(): void {
    this.fields().addPoint(this.usualUnit());
    this.focusOn(() => this.firsts().at(-1));
  }

  protected remove(index: number): void {
    this.fields().removePoint(index);
    this.focusOn(
      () => this.firsts()[Math.max(0, index - 1)] ?? this.element.nativeElement.querySelector<HTMLElement>('.add'),
    );
  }

  private focusOn(target: () => HTMLElement | null | undefined): void {
    afterNextRender(() => target()?.focus(), { injector: this.injector });
  }

  private firsts(): HTMLElement[] {
    return [...this.element.nativeElement.querySelectorAll<HTMLElement>('input.first')];
  }
}
