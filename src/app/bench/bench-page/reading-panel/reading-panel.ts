import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  type ElementRef,
  inject,
  viewChild,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { expectedBand } from '#shared/plan/expected-band';
import { cautionOf, methodNote } from '#shared/plan/method-notes';
import { UnitWaveforms } from '../../../waveforms/unit-waveforms/unit-waveforms';
import { isReadOff } from '../../../waveforms/read-off';
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
import { failureWords } from '../../sheet/failure-words';
import { InstrumentChoice } from '../../sheet/instrument-choice';
import { PlausibilityCheck } from '../../sheet/plausibility-check';
import { ReadingDraft } from '../../sheet/reading-draft';
import { DeskCommands } from '../desk-commands';
import { lowerThan } from '../screen-height';
import { WarmUp } from '../warm-up';
import { AttributeEntry } from './attribute-entry';
import { CellActions } from './cell-actions';
import { CellHistory } from './cell-history';
import { CellUncertainty } from './cell-uncertainty';
import { ComputedEntry } from './computed-entry';
import { DirectEntry } from './direct-entry';
import { InstrumentField } from './instrument-field';
import { PanelCaution } from './panel-caution';
import { PanelCell } from './panel-cell';
import { PlausibilityQuestion } from './plausibility-question';
import { RefusedReading } from './refused-reading';

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
    PlausibilityQuestion,
    RefusedReading,
    RouterLink,
    ScopeReader,
    UnitWaveforms,
    VerdictChip,
  ],
  providers: [PanelCell, CellUncertainty],
  templateUrl: './reading-panel.html',
  styleUrl: './reading-panel.scss',
  host: { 'aria-label': 'Reading', role: 'region' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingPanel {
  protected readonly sheet = inject(BenchSheet);
  /** Waveforms are loaded where a reading can be taken from one. */
  protected readonly readsOff = isReadOff;
  private readonly settings = inject(BenchSettings);
  protected readonly commands = inject(DeskCommands);
  protected readonly cursor = inject(BenchCursor);
  protected readonly draft = inject(ReadingDraft);
  protected readonly check = inject(PlausibilityCheck);
  protected readonly choice = inject(InstrumentChoice);
  protected readonly warmUp = inject(WarmUp);
  protected readonly cell = inject(PanelCell);
  protected readonly uncertainty = inject(CellUncertainty);
  protected readonly mayMeasure = inject(BenchHand).mayMeasure;

  private readonly direct = viewChild(DirectEntry);
  private readonly scope = viewChild(ScopeReader);
  private readonly attribute = viewChild(AttributeEntry);
  private readonly question = viewChild(PlausibilityQuestion);
  private readonly body = viewChild<ElementRef<HTMLElement>>('body');

  protected readonly low = lowerThan(860);
  protected readonly narrow = narrowerThan(1000);
  protected readonly quantity = computed(() => scopeQuantity(this.cell.characteristic()));
  protected readonly outside = computed(() => this.cursor.at().unit > this.cursor.stop().requiredTo);
  protected readonly band = computed(() => expectedBand(this.cell.characteristic(), this.sheet.bench().expected));
  protected readonly model = computed(() => (this.band() === null ? 'No rectifier model for this part.' : ''));
  protected readonly bracket = computed(() => {
    const band = this.band();
    return band && ([band.low, band.high] as const);
  });
  /** Whether a question about the value stands in the panel, or was answered: advice beside the fields would say it twice. */
  protected readonly asked = computed(() => {
    const answered = !this.draft.started() && (this.cell.standing()?.question ?? null) !== null;
    return answered || this.check.asking() || this.cell.openQuestion() !== undefined;
  });
  /** The page with the uncertainty budget of the value that is kept; null while there is none. */
  protected readonly budget = computed(() => {
    const { kind, key } = this.cell.characteristic();
    const isKept = kind === 'computed' ? this.cell.number() !== null : this.cell.standing()?.state === 'kept';
    if (kind === 'attribute' || !isKept || this.draft.started()) return null;
    return ['/lots', this.sheet.bench().lot.id, 'units', this.cursor.at().unit, 'budgets', key];
  });
  /** What there is to beware of, in the plan's words or those of the kind of measurement. */
  protected readonly caution = computed(() => cautionOf(this.cell.characteristic()));
  /** How this kind of quantity is measured. */
  protected readonly kindNote = computed(() => methodNote(this.cell.characteristic()).method);
  /** What is odd about the value, in words. */
  protected readonly odd = computed(() => this.cell.plausibility()?.sentence ?? '');
  protected readonly consequence = computed(() => failureWords(this.sheet, this.draft));

  constructor() {
    effect(() => {
      this.cursor.at();
      const body = this.body()?.nativeElement;
      if (body) body.scrollTop = 0;
    });
  }

  /** Puts the cursor into the first field; text replaces what stands there. */
  focusFirst(text?: string): void {
    if (this.direct()) this.direct()?.focusFirst(text);
    else if (this.scope()) this.scope()?.focusFirst(text);
    else this.attribute()?.focusFirst();
  }

  /** Puts the cursor to the question that stands in the panel. */
  focusQuestion(): void {
    this.question()?.focus();
  }

  /** The scope's settings stay from reading to reading, the wave's height does not. */
  protected typeScope(entry: ScopeText): void {
    this.draft.scope.set(entry);
    const { form, coupling, voltsPerDivision, probeFactor } = entry;
    this.settings.change(this.settings.scope, { form, coupling, voltsPerDivision, probeFactor });
  }
}
