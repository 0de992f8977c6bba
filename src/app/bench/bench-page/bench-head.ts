import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { Icon } from '../../ui/marks/icon';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { CountPipe } from '../../ui/values/count-pipe';
import { BenchHand } from '../bench-hand';
import { BenchSettings } from '../bench-settings';
import { BenchSheet } from '../sheet/bench-sheet';
import { InstrumentChoice } from '../sheet/instrument-choice';
import { ConditionsFact } from './conditions-fact';
import { SavedState } from './saved-state';

/** Days before the due date from which a calibration is pointed out (common practice, no source). */
const WARNED_BEFORE = 30;

/** What is on the bench: lot, part, delivery, plan and instruments, and whether everything is saved. */
@Component({
  selector: 'qr-bench-head',
  imports: [ConditionsFact, CountPipe, Icon, MatButtonModule, MatMenuModule, RouterLink, SavedState, VerdictMark],
  templateUrl: './bench-head.html',
  styleUrl: './bench-head.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchHead {
  protected readonly sheet = inject(BenchSheet);
  protected readonly settings = inject(BenchSettings);
  protected readonly mayMeasure = inject(BenchHand).mayMeasure;
  private readonly instruments = inject(InstrumentChoice);

  readonly submitting = input(false);
  readonly submits = output();
  readonly showsRefused = output();
  readonly opensConditions = output();

  protected readonly lot = computed(() => this.sheet.bench().lot);
  protected readonly sampling = computed(() => this.sheet.bench().sampling);
  protected readonly planLine = computed(() => {
    const { level, severity, sampleSize, groups } = this.sampling();
    const ofPlan = groups.filter((group) => group.level === level);
    const letters = [...new Set((ofPlan.length > 0 ? ofPlan : groups).map(({ codeLetter }) => codeLetter))].join(', ');
    return `Level ${level}, letter ${letters}, n = ${sampleSize}, ${severity}`;
  });
  protected readonly inUse = computed(() => this.instruments.allInUse());
  /** The calibration that runs out first, when that is soon. */
  protected readonly due = computed(() => {
    const soon = this.inUse().filter(({ daysLeft }) => daysLeft <= WARNED_BEFORE);
    const [first] = soon.sort((one, other) => one.daysLeft - other.daysLeft);
    if (first === undefined) return '';
    const when = first.daysLeft === 0 ? 'today' : `in ${first.daysLeft} ${first.daysLeft === 1 ? 'day' : 'days'}`;
    return `${first.assetNumber} calibration due ${when}`;
  });

  protected toggleOrder(): void {
    const { order } = this.settings;
    this.settings.change(order, order() === 'by-unit' ? 'by-characteristic' : 'by-unit');
  }

  protected toggleLetters(): void {
    this.settings.change(this.settings.letters, !this.settings.letters());
  }
}
