import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Budget, type BudgetLine } from '#shared/contract/budgets';
import { ScrollRegion } from '../../ui/scroll-region';
import { freedomText, inputTitle, sensitivityText, shareText, smallQuantity } from './budget-words';

/** The components of an uncertainty, line by line, and what they combine to. */
@Component({
  selector: 'qr-budget-table',
  imports: [ScrollRegion],
  templateUrl: './budget-table.html',
  styleUrl: './budget-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BudgetTable {
  readonly budget = input.required<Budget>();

  protected readonly computed = computed(() => this.budget().characteristic.kind === 'computed');
  protected readonly lines = computed(() => this.budget().result?.lines.map((line) => this.lineOf(line)) ?? []);
  protected readonly notes = computed(() => this.lines().filter((line) => line.note !== null));
  protected readonly sum = computed(() => {
    const { result, coverageFactor } = this.budget();
    if (result === null) return null;
    const unit = this.unit();
    return {
      standard: smallQuantity(result.standardUncertainty, unit),
      freedom: freedomText(result.degreesOfFreedom),
      coverageFactor,
      expanded: smallQuantity(result.expandedUncertainty, unit),
    };
  });

  private readonly unit = computed(() => unitOf(this.budget().characteristic));

  private lineOf(line: BudgetLine) {
    const budget = this.budget();
    const source = budget.readings.find(({ input }) => input === line.input)?.characteristic;
    const inputUnit = source === undefined ? this.unit() : unitOf(source);
    return {
      ...line,
      of: inputTitle(budget, line.input),
      halfWidthText: line.halfWidth === null ? '' : smallQuantity(line.halfWidth, inputUnit),
      uncertaintyText: smallQuantity(line.standardUncertainty, inputUnit),
      sensitivityText: sensitivityText(line.sensitivity, this.unit(), inputUnit),
      contributionText: smallQuantity(line.contribution, this.unit()),
      shareText: line.share === null ? '' : shareText(line.share),
      freedomText: freedomText(line.degreesOfFreedom),
    };
  }
}

function unitOf(characteristic: Budget['characteristic']): string {
  return characteristic.kind === 'attribute' ? '' : characteristic.unit;
}
