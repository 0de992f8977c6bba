import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { type Assessment } from '#shared/contract/decision';
import { LimitRug } from '../../ui/limit-strip/limit-rug';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { LimitsPipe } from '../../ui/values/limits-pipe';
import { ReadingPipe } from '../../ui/values/reading-pipe';
import { characteristicRow } from './characteristic-row';
import { ReadingTable } from './reading-table';
import { unitNumbers } from './unit-look';

/** What failed, characteristic by characteristic, then what conforms; every single reading on demand. */
@Component({
  selector: 'qr-characteristic-results',
  imports: [ClassGlyph, LimitRug, LimitsPipe, ReadingPipe, ReadingTable],
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
}
