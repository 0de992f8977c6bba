import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { type Assessment } from '#shared/contract/decision';
import { LimitRug } from '../../ui/limit-strip/limit-rug';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { LimitsPipe } from '../../ui/values/limits-pipe';
import { ReadingPipe } from '../../ui/values/reading-pipe';
import { readingDigits } from '../../ui/values/reading-text';
import { displayUnit } from '#shared/quantities/format-quantity';
import { uncertaintyDigits } from '#shared/quantities/format-uncertainty';
import { characteristicRow, type CharacteristicRow } from './characteristic-row';
import { ReadingTable } from './reading-table';
import { unitNumbers } from './unit-look';
import { ScrollRegion } from '../../ui/scroll-region';

/** What failed, characteristic by characteristic, then what conforms; every single reading on demand. */
@Component({
  selector: 'qr-characteristic-results',
  imports: [ClassGlyph, LimitRug, LimitsPipe, ReadingPipe, ReadingTable, ScrollRegion],
  templateUrl: './characteristic-results.html',
  styleUrl: './characteristic-results.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CharacteristicResults {
  readonly assessment = input.required<Assessment>();

  private readonly rows = computed(() => this.assessment().characteristics.map(characteristicRow));
  protected readonly failing = computed(() => this.rows().filter((row) => row.failedUnits.length > 0));
  protected readonly conforming = computed(() => this.rows().filter((row) => row.failedUnits.length === 0));
  protected readonly all = signal(false);
  protected readonly unitNumbers = unitNumbers;

  /** A figure without its unit, which stands under the characteristic's name; a mean has one decimal more. */
  protected digits(value: number | null, { unit, decimals }: { unit: string; decimals: number }, more = 0): string {
    return value === null ? '' : readingDigits(value, unit, decimals + more);
  }

  /** The largest U of a row's readings, as its figures stand; empty where it is not known. */
  protected uncertainty({ uncertainty }: CharacteristicRow, unit: string): string {
    return uncertainty === null ? '' : `±\u00a0${uncertaintyDigits(uncertainty, unit)}`;
  }

  protected unitLine({ scale, condition }: CharacteristicRow): string {
    const unit = scale === null ? '' : displayUnit(scale.unit).label;
    return [unit, condition].filter((part) => part !== '').join(', ');
  }
}
