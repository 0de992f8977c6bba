import { ChangeDetectionStrategy, Component, effect, input, signal, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenuModule } from '@angular/material/menu';
import { type Part } from '#shared/contract/parts';
import { type Characteristic, type Revision } from '#shared/contract/plans';
import { listInstruments } from '#shared/contract/instruments';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { ElectricalFacts } from '../../ui/electrical-facts';
import { Icon } from '../../ui/marks/icon';
import { ChangesSheet } from './changes-sheet';
import { CharacteristicPanel } from './characteristic-panel';
import { CharacteristicTable } from './characteristic-table';
import { DecisionSheet } from './decision-sheet';
import { FaultList } from './fault-list';
import { newCharacteristic } from './new-characteristic';
import { type PlanDraft } from './plan-draft';
import { SamplingSheet } from './sampling-sheet';

/** Size of a usual delivery, common practice, no source; the reader may type another. */
const TYPICAL_LOT = 1200;

/** The content of a plan revision: its characteristics, the chosen one at the side, its sampling, its part, its changes. */
@Component({
  selector: 'qr-plan-editor',
  imports: [
    ChangesSheet,
    CharacteristicPanel,
    CharacteristicTable,
    DecisionSheet,
    ElectricalFacts,
    FaultList,
    Icon,
    MatButton,
    MatMenuModule,
    SamplingSheet,
  ],
  templateUrl: './plan-editor.html',
  styleUrl: './plan-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlanEditor {
  readonly draft = input.required<PlanDraft>();
  readonly editable = input.required<boolean>();
  readonly part = input.required<Part | null>();
  readonly revision = input<number | null>(null);
  /** The revision that the changes are counted from. */
  readonly against = input<Revision | null>(null);

  protected readonly lotSize = signal(TYPICAL_LOT);
  private readonly mayReadInstruments = may(listInstruments);
  private readonly instruments = endpointResource(listInstruments, () => (this.mayReadInstruments() ? {} : undefined));

  constructor() {
    effect(() => {
      if (!this.instruments.hasValue()) return;
      const { items } = this.instruments.value();
      const draft = this.draft();
      untracked(() => draft.instruments.set(items));
    });
  }

  protected add(kind: Characteristic['kind']): void {
    this.draft().add(newCharacteristic(kind));
  }
}
