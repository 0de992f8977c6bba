import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { type NotedConditions } from '#shared/contract/conditions';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { BenchHand } from '../bench-hand';
import { BenchSheet } from '../sheet/bench-sheet';
import { WarmUp } from './warm-up';

/** What the lot is measured under, and how far the warm-up is, in the head of the bench; opens the notes. */
@Component({
  selector: 'qr-conditions-fact',
  template: `
    @if (mayMeasure()) {
      <button type="button" title="Conditions (C)" (click)="opened.emit()">
        <b>{{ noted() }}</b>
        <span>{{ below() }}</span>
      </button>
    } @else {
      <b>{{ noted() }}</b>
      <span>{{ below() }}</span>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-direction: column;
      min-width: 0;
      max-width: 190px;
      color: var(--qr-ink-2);
      font: var(--qr-t-small);
    }
    button {
      display: grid;
      min-width: 0;
      padding: 0;
      border: 0;
      background: none;
      color: inherit;
      font: inherit;
      text-align: left;
      cursor: pointer;
    }
    button:hover b {
      text-decoration: underline;
    }
    b {
      color: var(--qr-ink);
      font-weight: 500;
    }
    b,
    span {
      overflow: hidden;
      text-overflow: ellipsis;
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConditionsFact {
  private readonly sheet = inject(BenchSheet);
  private readonly warmUp = inject(WarmUp);
  protected readonly mayMeasure = inject(BenchHand).mayMeasure;

  readonly opened = output();

  protected readonly noted = computed(() => {
    const { conditions } = this.sheet.bench();
    return conditions === null ? 'Conditions' : conditionWords(conditions);
  });
  protected readonly below = computed(() => {
    switch (this.warmUp.state()) {
      case 'not-started':
        return `Warm-up ${this.warmUp.minutes()} min not started`;
      case 'running':
        return `Warm-up ${this.warmUp.left()} left`;
      case 'done':
        return 'Warmed up';
      case 'not-asked':
        return this.sheet.bench().conditions === null ? 'None noted' : 'Conditions noted';
    }
  });
}

function conditionWords({ ambientCelsius, mainsVolts, mainsHertz, load }: NotedConditions): string {
  const parts = [
    ambientCelsius === null ? '' : formatQuantity(ambientCelsius, '°C'),
    mainsVolts === null ? '' : formatQuantity(mainsVolts, 'V'),
    mainsHertz === null ? '' : formatQuantity(mainsHertz, 'Hz'),
    load,
  ];
  return parts.filter((part) => part !== '').join(', ') || 'Conditions';
}
