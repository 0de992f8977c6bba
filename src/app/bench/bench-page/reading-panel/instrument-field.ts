import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { INSTRUMENT_KIND_TITLES, type Instrument } from '#shared/contract/instruments';
import { InstrumentDue } from '../../../ui/marks/instrument-due';
import { InstrumentChoice } from '../../sheet/instrument-choice';
import { ReadingDraft } from '../../sheet/reading-draft';
import { waitsForCheck } from '../../sheet/why-unusable';
import { DailyCheck } from './daily-check';

/** Stands for no named range in the list, which takes no null for a choice. */
const AUTOMATIC = 0;

/**
 * Which instrument takes the readings, and on which range. One that may not be used is shown with the reason and cannot be
 * chosen; one that only waits for the check of the day is checked right here.
 */
@Component({
  selector: 'qr-instrument-field',
  imports: [DailyCheck, InstrumentDue, MatButton, MatFormFieldModule, MatSelectModule],
  templateUrl: './instrument-field.html',
  styleUrl: './instrument-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentField {
  private readonly draft = inject(ReadingDraft);
  protected readonly choice = inject(InstrumentChoice);

  protected readonly title = computed(() => {
    const kind = this.choice.kind();
    return kind === null ? 'Instrument' : INSTRUMENT_KIND_TITLES[kind];
  });
  /** Instruments that only wait for their check, beside the one whose check is shown. */
  protected readonly waiting = computed(() => {
    const shown = this.checking();
    return this.choice
      .offered()
      .map(({ instrument }) => instrument)
      .filter((instrument) => waitsForCheck(instrument) && instrument.id !== shown?.id);
  });
  /** The instrument being checked: the one that would be used, or the one the person picked. */
  protected readonly checking = linkedSignal<Instrument | null>(() => this.choice.toCheck());
  /** The range that "automatic" takes for what is typed. */
  protected readonly automatic = computed(() => {
    const range = this.draft.range();
    return range.state === 'chosen' && this.choice.named() === null ? range.range.name : '';
  });
  protected readonly refusal = computed(() => {
    const range = this.draft.range();
    return range.state === 'refused' ? range.message : '';
  });

  protected readonly automaticId = AUTOMATIC;

  protected chooseRange(id: number): void {
    this.choice.chooseRange(id === AUTOMATIC ? null : id);
  }

  protected choose(id: number): void {
    const found = this.choice.offered().find(({ instrument }) => instrument.id === id);
    if (found?.instrument.usable) this.choice.choose(found.instrument);
  }

  protected passed(instrument: Instrument): void {
    this.choice.choose(instrument);
    this.checking.set(null);
  }
}
