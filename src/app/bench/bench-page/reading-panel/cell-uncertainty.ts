import { computed, inject, Injectable } from '@angular/core';
import { type ReadingEntry } from '#shared/contract/bench';
import { type InstrumentRange } from '#shared/contract/instruments';
import { expandedUncertainty } from '#shared/uncertainty/expanded-uncertainty';
import { uncertaintyText } from '../../../ui/values/uncertainty-text';
import { BenchSheet } from '../../sheet/bench-sheet';
import { InstrumentChoice } from '../../sheet/instrument-choice';
import { ReadingDraft } from '../../sheet/reading-draft';
import { rangeById } from '../../sheet/reading-range';
import { uncertaintyReason } from '../../sheet/uncertainty-words';
import { PanelCell } from './panel-cell';
import { ruleWords } from './rule-words';

/** The uncertainty of the value in the panel, typed or kept, and how the plan's decision rule takes it. */
@Injectable()
export class CellUncertainty {
  private readonly sheet = inject(BenchSheet);
  private readonly draft = inject(ReadingDraft);
  private readonly cell = inject(PanelCell);
  private readonly choice = inject(InstrumentChoice);

  /** U in SI base units; null where it is not known. */
  readonly halfWidth = computed(() => {
    const judged = this.cell.judged().expandedUncertainty;
    if (judged !== null) return judged;
    return this.draft.started() ? this.typed() : this.kept();
  });
  /** U as it stands beside the value, with what it consists of; null where it is not known. */
  readonly shown = computed(() => {
    const [halfWidth, characteristic] = [this.halfWidth(), this.cell.characteristic()];
    if (halfWidth === null || characteristic.kind === 'attribute') return null;
    return { text: uncertaintyText(halfWidth, characteristic.unit), reason: this.reason() };
  });
  /** Width of the guard bands. */
  readonly guard = computed(() => (this.sheet.budgets().asked ? (this.halfWidth() ?? 0) : 0));
  /** How the plan judges this value. */
  readonly rule = computed(() =>
    ruleWords(this.sheet.bench().decisionRule, this.cell.characteristic(), this.halfWidth()),
  );
  /** The step to which the screen in use is read, in divisions; null where it is not known. */
  readonly step = computed(() => {
    const [ahead] = this.choice.ranges();
    const range = this.range() ?? this.choice.named() ?? ahead;
    return range?.form === 'graticule' ? range.readingStep : null;
  });

  private readonly outcome = computed(() => {
    const outcome = this.draft.outcome();
    return outcome.state === 'read' ? outcome : null;
  });
  private readonly entry = computed<ReadingEntry | null>(
    () => this.outcome()?.entry ?? this.cell.standing()?.entry ?? null,
  );
  private readonly range = computed<InstrumentRange | undefined>(() => {
    if (this.draft.started()) {
      const range = this.draft.range();
      return range.state === 'chosen' ? range.range : undefined;
    }
    return rangeById(this.sheet.bench().instruments, this.cell.standing()?.rangeId ?? null);
  });

  private typed(): number | null {
    const [outcome, range] = [this.outcome(), this.range()];
    if (outcome === null || range === undefined || typeof outcome.value !== 'number') return null;
    return this.expanded(outcome.value, outcome.entry, range);
  }

  private kept(): number | null {
    const [standing, range] = [this.cell.standing(), this.range()];
    if (standing === undefined) return null;
    if (standing.expandedUncertainty !== null) return standing.expandedUncertainty;
    if (range === undefined || standing.value === null || standing.entry === null) return null;
    return this.expanded(standing.value, standing.entry, range);
  }

  private expanded(value: number, entry: ReadingEntry, range: InstrumentRange): number {
    const budget = this.sheet.budgets().ofTyped(this.cell.characteristic(), value, entry, range);
    return expandedUncertainty(budget, this.sheet.bench().coverageFactor);
  }

  private reason(): string {
    const { coverageFactor } = this.sheet.bench();
    const range = this.range();
    if (range === undefined) return `k = ${coverageFactor}`;
    return uncertaintyReason(range, this.entry(), this.cell.characteristic(), coverageFactor);
  }
}
