import { ChangeDetectionStrategy, Component, computed, inject, viewChild } from '@angular/core';
import { narrowerThan } from '../../../shell/screen-width';
import { ScopeReader } from '../../../ui/scope-reader/scope-reader';
import { type ScopeText } from '../../../ui/scope-reader/scope-text';
import { LimitStrip } from '../../../ui/limit-strip/limit-strip';
import { ClassGlyph } from '../../../ui/marks/class-glyph';
import { VerdictChip } from '../../../ui/marks/verdict-chip';
import { MessageNote } from '../../../ui/states/message-note';
import { BenchHand } from '../../bench-hand';
import { BenchSettings } from '../../bench-settings';
import { scopeQuantity } from '../../sheet/bench-reading';
import { BenchCursor } from '../../sheet/bench-cursor';
import { BenchSheet } from '../../sheet/bench-sheet';
import { InstrumentChoice } from '../../sheet/instrument-choice';
import { ReadingDraft } from '../../sheet/reading-draft';
import { ReadingQueue } from '../../waiting/reading-queue';
import { DeskCommands } from '../desk-commands';
import { lowerThan } from '../screen-height';
import { AttributeEntry } from './attribute-entry';
import { CellActions } from './cell-actions';
import { CellHistory } from './cell-history';
import { ComputedEntry } from './computed-entry';
import { DirectEntry } from './direct-entry';
import { InstrumentField } from './instrument-field';
import { PanelCaution } from './panel-caution';
import { PanelCell } from './panel-cell';

/** The panel of the cell in focus: where its reading is typed, seen against its limits, and kept. */
@Component({
  selector: 'qr-reading-panel',
  imports: [
    AttributeEntry,
    CellActions,
    CellHistory,
    ClassGlyph,
    ComputedEntry,
    DirectEntry,
    InstrumentField,
    LimitStrip,
    MessageNote,
    PanelCaution,
    ScopeReader,
    VerdictChip,
  ],
  providers: [PanelCell],
  templateUrl: './reading-panel.html',
  styleUrl: './reading-panel.scss',
  host: { 'aria-label': 'Reading', role: 'region' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingPanel {
  private readonly sheet = inject(BenchSheet);
  private readonly queue = inject(ReadingQueue);
  private readonly settings = inject(BenchSettings);
  protected readonly commands = inject(DeskCommands);
  protected readonly cursor = inject(BenchCursor);
  protected readonly draft = inject(ReadingDraft);
  protected readonly choice = inject(InstrumentChoice);
  protected readonly cell = inject(PanelCell);
  protected readonly mayMeasure = inject(BenchHand).mayMeasure;

  private readonly direct = viewChild(DirectEntry);
  private readonly scope = viewChild(ScopeReader);
  private readonly attribute = viewChild(AttributeEntry);

  protected readonly low = lowerThan(860);
  protected readonly narrow = narrowerThan(1000);
  protected readonly quantity = computed(() => scopeQuantity(this.cell.characteristic()));
  protected readonly outside = computed(() => this.cursor.at().unit > this.cursor.stop().requiredTo);

  /** Puts the cursor into the first field; text replaces what stands there. */
  focusFirst(text?: string): void {
    if (this.direct()) this.direct()?.focusFirst(text);
    else if (this.scope()) this.scope()?.focusFirst(text);
    else this.attribute()?.focusFirst();
  }

  /** The scope's settings stay from reading to reading, the wave's height does not. */
  protected typeScope(entry: ScopeText): void {
    this.draft.scope.set(entry);
    const { form, coupling, voltsPerDivision, probeFactor } = entry;
    this.settings.change(this.settings.scope, { form, coupling, voltsPerDivision, probeFactor });
  }

  protected resend(id: string): void {
    this.queue.resend(id);
  }

  protected discard(id: string): void {
    this.sheet.discardRefused(this.cursor.at().unit, id);
  }
}
