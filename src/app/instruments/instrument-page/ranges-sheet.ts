import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { changeInstrument, type Instrument, type InstrumentRange } from '#shared/contract/instruments';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { accuracyText, resolutionText } from '#shared/uncertainty/accuracy-text';
import { RecordSave } from '../../data/record-save';
import { may } from '../../session/may';
import { Confirm } from '../../ui/confirm/confirm';
import { Icon } from '../../ui/marks/icon';
import { ScrollRegion } from '../../ui/scroll-region';
import { MessageNote } from '../../ui/states/message-note';
import { ChangeRanges } from './change-ranges';
import { RangeDialog } from './range-dialog';

const CURRENT_WORDS = { dc: ' DC', ac: ' AC', any: '' } as const;

function rowOf(range: InstrumentRange) {
  const isDigital = range.form === 'digital';
  return {
    id: range.id,
    name: range.name,
    reads: isDigital ? range.unit + CURRENT_WORDS[range.current] : 'V, by its graticule',
    upTo: isDigital ? formatQuantity(range.fullScale, range.unit) : `${range.screenDivisions} divisions`,
    accuracy: accuracyText(range),
    resolution: resolutionText(range),
  };
}

/** The ranges of an instrument with their accuracy specification, and the ways to add and retire one. */
@Component({
  selector: 'qr-ranges-sheet',
  imports: [Icon, MatButton, MessageNote, ScrollRegion],
  templateUrl: './ranges-sheet.html',
  styleUrl: './ranges-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RangesSheet {
  private readonly changes = new ChangeRanges();
  private readonly confirm = inject(Confirm);
  private readonly dialog = inject(MatDialog);

  readonly instrument = input.required<Instrument>();
  /** The instrument as it is after a range was added or retired. */
  readonly changed = output<Instrument>();

  protected readonly mayChange = may(changeInstrument);
  protected readonly saving = new RecordSave();
  protected readonly rows = computed(() => this.instrument().ranges.map(rowOf));

  protected add(): void {
    this.dialog
      .open<RangeDialog, Instrument, Instrument>(RangeDialog, { data: this.instrument() })
      .afterClosed()
      .subscribe((instrument) => {
        if (instrument) this.changed.emit(instrument);
      });
  }

  protected retire({ id, name }: { id: number; name: string }): void {
    const instrument = this.instrument();
    const step = {
      title: `Retire the range ${name}?`,
      text: ['It cannot be chosen for a reading any more. Readings taken on it keep it, with its accuracy.'],
      confirm: 'Retire range',
      destructive: true,
    };
    this.confirm.ask(step).subscribe((yes) => {
      if (yes) this.saving.run(this.changes.retire(instrument.id, id), (saved) => this.changed.emit(saved));
    });
  }
}
