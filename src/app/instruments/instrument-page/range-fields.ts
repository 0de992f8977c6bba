import { FormControl, FormGroup } from '@angular/forms';
import { type Instrument, type RangeBody, rangeBody, type RANGE_UNITS } from '#shared/contract/instruments';

type Form = RangeBody['form'];
type Unit = (typeof RANGE_UNITS)[number];

const quantity = (value: number | null = null) => new FormControl<number | null>(value);

/** What each kind of instrument mostly reads. */
const UNIT_OF_KIND: Readonly<Record<Instrument['kind'], Unit>> = {
  multimeter: 'V',
  oscilloscope: 'V',
  'electronic-load': 'A',
  'insulation-tester': 'Ω',
  'power-meter': 'W',
  thermometer: 'K',
  rule: 'm',
};

/** The fields of a range: with digits, or a screen that is read by its graticule. Shares are fractions. */
export class RangeFields {
  readonly group;

  constructor(kind: Instrument['kind']) {
    const form: Form = kind === 'oscilloscope' ? 'graticule' : 'digital';
    this.group = new FormGroup({
      form: new FormControl<Form>(form, { nonNullable: true }),
      name: new FormControl('', { nonNullable: true }),
      unit: new FormControl<Unit>(UNIT_OF_KIND[kind], { nonNullable: true }),
      current: new FormControl<'dc' | 'ac' | 'any'>(kind === 'multimeter' ? 'dc' : 'any', { nonNullable: true }),
      fullScale: quantity(),
      resolution: quantity(),
      ofReading: quantity(0),
      ofRange: quantity(0),
      counts: quantity(0),
      screenDivisions: quantity(8),
      ofFullScale: quantity(0),
      readingStep: quantity(0.1),
    });
  }

  /** The range as it would be sent. */
  value(): object {
    const { form, name, unit, current, fullScale, resolution, ofReading, ofRange, counts, ...screen } =
      this.group.getRawValue();
    if (form === 'graticule') return { form, name, unit: 'V', ofReading, ...screen };
    const kindOfCurrent = unit === 'V' || unit === 'A' ? current : 'any';
    return { form, name, unit, current: kindOfCurrent, fullScale, resolution, ofReading, ofRange, counts };
  }

  /** The range, whatever its name; null while it is not whole. */
  whole(): RangeBody | null {
    const read = rangeBody.safeParse({ ...this.value(), name: 'Range' });
    return read.success ? read.data : null;
  }
}
