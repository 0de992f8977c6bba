import {
  afterNextRender,
  ApplicationRef,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  input,
  output,
  untracked,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { type Bench, keepReading } from '#shared/contract/bench';
import { LOT_STATUS_TITLES, type LotStatus, STATIONS } from '#shared/contract/lots';
import { cautionOf } from '#shared/plan/method-notes';
import { may } from '../../session/may';
import { narrowerThan } from '../../shell/screen-width';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { BenchHand } from '../bench-hand';
import { BenchActs } from '../sheet/bench-acts';
import { BenchCursor } from '../sheet/bench-cursor';
import { BenchSheet } from '../sheet/bench-sheet';
import { PasteDesk } from '../paste/paste-desk';
import { InstrumentChoice } from '../sheet/instrument-choice';
import { PlausibilityCheck } from '../sheet/plausibility-check';
import { ReadingDraft } from '../sheet/reading-draft';
import { ReadingQueue } from '../waiting/reading-queue';
import { BenchHead } from './bench-head';
import { CellActions } from './reading-panel/cell-actions';
import { DeskCommands } from './desk-commands';
import { BenchQuestions } from './dialogs/bench-questions';
import { KeyHints } from './key-hints';
import { LotSubmission } from './lot-submission';
import { ConditionNotes } from './condition-notes';
import { OthersAtWork } from './others-at-work';
import { UnitRulings } from './unit-rulings';
import { MeasuringGrid } from './measuring-grid/measuring-grid';
import { NumberPad } from './number-pad';
import { PanelCaution } from './reading-panel/panel-caution';
import { ReadingPanel } from './reading-panel/reading-panel';
import { RefusedActs } from './refused-acts';
import { RunningVerdict } from './running-verdict';
import { SampleOverview } from './sample-overview';
import { WarmUp } from './warm-up';

const AT_BENCH: readonly LotStatus[] = STATIONS.bench;

/** One lot on the bench: the sample, the grid of readings, and the panel where they are typed. */
@Component({
  selector: 'qr-bench-desk',
  imports: [
    BenchHead,
    CellActions,
    KeyHints,
    MeasuringGrid,
    NumberPad,
    PanelCaution,
    ReadingPanel,
    ReadOnlyNote,
    RefusedActs,
    RunningVerdict,
    SampleOverview,
  ],
  providers: [
    BenchSheet,
    BenchActs,
    BenchCursor,
    InstrumentChoice,
    ReadingDraft,
    PlausibilityCheck,
    BenchHand,
    BenchQuestions,
    DeskCommands,
    LotSubmission,
    WarmUp,
    ConditionNotes,
    UnitRulings,
    PasteDesk,
    OthersAtWork,
  ],
  templateUrl: './bench-desk.html',
  styleUrl: './bench-desk.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchDesk {
  private readonly application = inject(ApplicationRef);
  private readonly queue = inject(ReadingQueue);
  private readonly draft = inject(ReadingDraft);
  private readonly cursor = inject(BenchCursor);
  private readonly acts = inject(BenchActs);
  protected readonly sheet = inject(BenchSheet);
  protected readonly hand = inject(BenchHand);
  protected readonly commands = inject(DeskCommands);
  protected readonly submission = inject(LotSubmission);
  protected readonly others = inject(OthersAtWork);

  readonly bench = input.required<Bench>();
  /** The lot should be read again: somebody else's work shows through. */
  readonly stale = output();

  private readonly grid = viewChild(MeasuringGrid);
  private readonly panel = viewChild(ReadingPanel);
  private readonly panelElement = viewChild(ReadingPanel, { read: ElementRef<HTMLElement> });

  protected readonly narrow = narrowerThan(1000);
  protected readonly caution = computed(() => cautionOf(this.cursor.stop().characteristic));
  private readonly merged = narrowerThan(1360);
  private readonly mayKeep = may(keepReading);

  /** Why nothing can be typed, where nothing can. */
  protected readonly readOnly = computed(() => {
    const { status } = this.sheet.bench().lot;
    if (AT_BENCH.includes(status)) return 'Inspectors and quality measure. You see what they have measured so far.';
    const reopened = status === 'submitted' ? ' Quality can open it again.' : '';
    return `This lot has left the bench: ${LOT_STATUS_TITLES[status].toLowerCase()}.${reopened}`;
  });

  constructor() {
    effect(() => {
      const bench = this.bench();
      untracked(() => {
        this.acts.open(bench);
        this.others.begin(bench.cursor);
        this.cursor.start();
      });
    });
    // Typing goes to the grid at once, unless the person is already somewhere else on the page.
    afterNextRender(() => {
      if (document.activeElement === document.body || document.activeElement?.id === 'content')
        queueMicrotask(() => this.grid()?.focusCell());
    });
    effect(() => this.cursor.merged.set(this.merged()));
    effect(() => {
      const atBench = this.sheet.opened() && AT_BENCH.includes(this.sheet.bench().lot.status);
      this.hand.mayMeasure.set(this.mayKeep() && atBench);
    });
    this.acts.stale.pipe(takeUntilDestroyed()).subscribe(() => this.stale.emit());
    this.commands.toGrid.pipe(takeUntilDestroyed()).subscribe(() => this.grid()?.focusCell());
    this.commands.toPanel.pipe(takeUntilDestroyed()).subscribe((text) => {
      // The next character may come before the next frame, as from a scanner: the panel must show this cell's field now.
      this.application.tick();
      this.panel()?.focusFirst(text);
    });
    this.commands.toQuestion.pipe(takeUntilDestroyed()).subscribe(() => {
      this.application.tick();
      this.panel()?.focusQuestion();
    });
  }

  /** Whether leaving would lose something: a reading half typed, or one this browser could not write down. */
  hasUnsaved(): boolean {
    return this.draft.started() || this.queue.atRisk();
  }

  protected panelHost(): HTMLElement | undefined {
    return this.panelElement()?.nativeElement;
  }

  /** Goes to the first reading that waits for an answer. */
  protected showQuestion(): void {
    const [first] = this.sheet.openQuestions();
    if (first === undefined || !this.draft.mayLeave()) return;
    this.cursor.choose(first.unit, first.reading.characteristicKey);
    this.grid()?.focusCell();
  }

  protected showRefused(): void {
    const acts = this.queue.refused().map(({ act }) => act);
    const refused = acts.find((act) => act.kind === 'reading' && act.lotId === this.bench().lot.id);
    if (refused?.kind !== 'reading' || !this.draft.mayLeave()) return;
    this.cursor.choose(refused.unit, refused.body.characteristicKey);
    this.grid()?.focusCell();
  }
}
