import { ChangeDetectionStrategy, Component, computed, effect, input, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatRadioModule } from '@angular/material/radio';
import { DECISION_RULE_TITLES, DECISION_RULES, type DecisionRule } from '#shared/contract/plans';
import { type Fault } from '#shared/contract/problem';
import { DECISION_RULE_MEANINGS } from '#shared/plan/decision-rule-words';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { GuardTable } from './guard-table';
import { type PlanDraft } from './plan-draft';

/** How measurement uncertainty enters the verdicts of a plan, by which factor it is expanded, and how long a unit warms up. */
@Component({
  selector: 'qr-decision-sheet',
  imports: [GuardTable, MatRadioModule, QuantityField, ReactiveFormsModule],
  templateUrl: './decision-sheet.html',
  styleUrl: './decision-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DecisionSheet {
  readonly draft = input.required<PlanDraft>();
  readonly editable = input.required<boolean>();

  protected readonly rules = DECISION_RULES.map((rule) => ({
    rule,
    title: DECISION_RULE_TITLES[rule],
    meaning: DECISION_RULE_MEANINGS[rule],
  }));

  protected readonly form = new FormGroup({
    decisionRule: new FormControl<DecisionRule>('simple', { nonNullable: true }),
    coverageFactor: new FormControl<number | null>(2),
    warmUpMinutes: new FormControl<number | null>(null),
  });

  protected readonly settings = computed(() => this.draft().settings());
  protected readonly stated = computed(() => {
    const { decisionRule, coverageFactor, warmUpMinutes } = this.settings();
    return {
      title: DECISION_RULE_TITLES[decisionRule],
      meaning: DECISION_RULE_MEANINGS[decisionRule],
      coverage: `k\u00a0=\u00a0${coverageFactor}`,
      warmUp: warmUpMinutes === null ? 'none asked' : `${warmUpMinutes}\u00a0min`,
    };
  });

  constructor() {
    effect(() => {
      this.draft().shownTimes();
      untracked(() => this.show());
    });
    effect(() => {
      const faults = this.draft().faults();
      untracked(() => this.showFaults(faults));
    });
    this.form.valueChanges.pipe(takeUntilDestroyed()).subscribe(() => this.keep());
  }

  private show(): void {
    const { decisionRule, coverageFactor, warmUpMinutes } = this.draft().settings();
    this.form.setValue({ decisionRule, coverageFactor, warmUpMinutes }, { emitEvent: false });
  }

  /** What is not a number is told, and is no reason to take the last one that was. */
  private keep(): void {
    const { coverageFactor, warmUpMinutes, decisionRule } = this.form.getRawValue();
    const before = this.draft().settings().coverageFactor;
    const change = { decisionRule, coverageFactor: coverageFactor ?? before, warmUpMinutes };
    this.draft().changeSettings(change, this.unread());
  }

  private unread(): Fault[] {
    const { coverageFactor, warmUpMinutes } = this.form.controls;
    return [
      ...misread('coverageFactor', coverageFactor, coverageFactor.value === null ? 'Give k, 2 for about 95 %.' : null),
      ...misread('warmUpMinutes', warmUpMinutes, null),
    ];
  }

  private showFaults(faults: readonly Fault[]): void {
    for (const name of ['coverageFactor', 'warmUpMinutes'] as const) {
      const fault = faults.find(({ path }) => path[0] === name);
      this.form.controls[name].setErrors(fault === undefined ? null : { fault: fault.message });
    }
  }
}

/** The fault of a number that is not understood, or that is missing. */
function misread(name: string, { errors }: FormControl<number | null>, missing: string | null): Fault[] {
  const said: unknown = errors?.['quantity'] ?? missing;
  return typeof said === 'string' ? [{ path: [name], message: said }] : [];
}
