import { FormArray, FormControl, FormGroup } from '@angular/forms';
import { signal } from '@angular/core';
import { type AS_FOUND, type Calibration } from '#shared/contract/calibrations';
import { RANGE_UNITS } from '#shared/contract/instruments';

const text = (value = '') => new FormControl(value, { nonNullable: true });
const quantity = () => new FormControl<number | null>(null);

/** The units points are given in: those of ranges, values in SI base units. */
export const POINT_UNITS = [...RANGE_UNITS, '°C', '%'] as const;

function pointGroup(unit: string) {
  return new FormGroup({
    point: text(),
    unit: text(unit),
    reference: quantity(),
    found: quantity(),
    limit: quantity(),
  });
}
export type PointGroup = ReturnType<typeof pointGroup>;

/** The same day a year later; the last of February for its 29th. */
export function aYearLater(day: string): string {
  const [year = 0, month = 1, date = 1] = day.split('-').map(Number);
  const later = new Date(Date.UTC(year + 1, month - 1, date));
  if (later.getUTCMonth() !== month - 1) later.setUTCDate(0);
  return later.toISOString().slice(0, 10);
}

/** The fields of a calibration, point by point. */
export class CalibrationFields {
  readonly points = new FormArray<PointGroup>([]);
  readonly group = new FormGroup({
    calibratedOn: text(),
    dueOn: text(),
    laboratory: text(),
    certificateNumber: text(),
    asFound: new FormControl<(typeof AS_FOUND)[number] | null>(null),
    adjusted: new FormControl(false, { nonNullable: true }),
    points: this.points,
    note: text(),
  });
  readonly rows = signal<readonly PointGroup[]>([]);

  /** Begins with what is likely: today, a year on, and the laboratory and points of the calibration before. */
  begin(today: string, before: Calibration | undefined): void {
    const { calibratedOn, dueOn, laboratory } = this.group.controls;
    calibratedOn.setValue(today);
    dueOn.setValue(aYearLater(today));
    laboratory.setValue(before?.laboratory ?? '');
    this.points.clear();
    for (const { point, unit, reference, limit } of before?.points ?? []) {
      const group = pointGroup(unit);
      group.patchValue({ point, reference, limit });
      this.points.push(group);
    }
    this.rows.set([...this.points.controls]);
  }

  addPoint(usualUnit: string): void {
    this.points.push(pointGroup(this.points.controls.at(-1)?.controls.unit.value ?? usualUnit));
    this.points.markAsDirty();
    this.rows.set([...this.points.controls]);
  }

  removePoint(index: number): void {
    this.points.removeAt(index);
    this.points.markAsDirty();
    this.rows.set([...this.points.controls]);
  }
}
