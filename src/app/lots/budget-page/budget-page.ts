import { ChangeDetectionStrategy, Component, computed, effect, inject, input, numberAttribute } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { readBudget } from '#shared/contract/budgets';
import { DECISION_RULE_MEANINGS } from '#shared/plan/decision-rule-words';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { BackLink } from '../../shell/back-link';
import { LimitStrip } from '../../ui/limit-strip/limit-strip';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { sentenceCase } from '../../ui/values/sentence-case';
import { readingText } from '../../ui/values/reading-text';
import { uncertaintyDecimals, uncertaintyText } from '../../ui/values/uncertainty-text';
import { lookOf } from '../../ui/verdict-look';
import { BudgetSources } from './budget-sources';
import { BudgetTable } from './budget-table';
import { finenessText, limitsText, probabilityText, ruleTitle, smallQuantity, verdictSentence } from './budget-words';

/** The uncertainty budget of one value of a lot, laid out line by line for whoever audits it. */
@Component({
  selector: 'qr-budget-page',
  imports: [BackLink, BudgetSources, BudgetTable, LimitStrip, Loaded, MatButton, MessageNote, PageState, VerdictChip],
  templateUrl: './budget-page.html',
  styleUrl: './budget-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BudgetPage {
  private readonly title = inject(PageTitle);

  readonly id = input.required({ transform: numberAttribute });
  readonly unit = input.required({ transform: numberAttribute });
  /** Key of the characteristic. */
  readonly key = input.required<string>();
  /** Another reading than the one that counts, from the query. */
  readonly reading = input<string>();

  protected readonly budget = endpointResource(readBudget, () => ({
    params: { id: this.id(), unit: this.unit(), key: this.key() },
    query: { reading: this.reading() },
  }));

  protected readonly shown = computed(() => {
    if (!this.budget.hasValue()) return null;
    const budget = this.budget.value();
    const { characteristic, value, result } = budget;
    if (characteristic.kind === 'attribute') return null;
    const { unit, decimals, lowerLimit: lower, upperLimit: upper } = characteristic;
    const U = result?.expandedUncertainty ?? 0;
    const fine = Math.max(decimals, U > 0 ? uncertaintyDecimals(U, unit) : 0);
    return {
      budget,
      characteristic,
      value: value === null ? 'No value' : readingText(value, unit, fine),
      uncertainty: result === null ? '' : uncertaintyText(U, unit),
      look: lookOf(result?.verdict),
      word: result === null ? '' : sentenceCase(result.verdict),
      limits: limitsText({ lower, upper }, characteristic),
    };
  });
  /** How the plan judges, as names and texts. */
  protected readonly facts = computed(() => {
    const shown = this.shown();
    const result = shown?.budget.result ?? null;
    if (shown === null || result === null) return [];
    const { budget, characteristic } = shown;
    const { unit, lowerLimit, upperLimit } = characteristic;
    const hasLimits = lowerLimit !== null || upperLimit !== null;
    const probability = result.conformityProbability;
    return [
      { name: 'Limits', value: shown.limits },
      { name: 'Decision rule', value: `${ruleTitle(budget)}. ${DECISION_RULE_MEANINGS[budget.decisionRule]}` },
      { name: 'Guard band', value: result.guardBand === 0 ? 'none' : smallQuantity(result.guardBand, unit) },
      { name: 'Accepted', value: limitsText(result.accepted, characteristic, result.guardBand) },
      { name: 'Verdict', value: verdictSentence(result, budget.decisionRule, hasLimits) },
      { name: 'Probability of conformity', value: probability === null ? 'no limit' : probabilityText(probability) },
      { name: 'Test uncertainty ratio', value: finenessText(result.fineness, characteristic) },
      { name: 'Coverage', value: result.coverage },
    ];
  });

  constructor() {
    effect(() => {
      const shown = this.shown();
      if (shown) this.title.show(`Budget, ${shown.budget.lot.number}`);
    });
  }

  protected print(): void {
    window.print();
  }
}
