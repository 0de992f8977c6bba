import { ChangeDetectionStrategy, Component, computed, effect, inject, input, numberAttribute } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { readAssessment } from '#shared/contract/decision';
import { endpointResource } from '../../data/api';
import { CharacteristicResults } from '../../lots/evidence/characteristic-results';
import { LotHead } from '../../lots/evidence/lot-head';
import { LotHistory } from '../../lots/evidence/lot-history';
import { lotPlate, plateToSign } from '../../lots/evidence/lot-plate';
import { MeasuredWith } from '../../lots/evidence/measured-with';
import { PlateOfLot } from '../../lots/evidence/plate-of-lot';
import { SampleSheet } from '../../lots/evidence/sample-sheet';
import { PageTitle } from '../../page-title';
import { LotDoubts } from '../../reviews/lot-doubts';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { SigningPanel } from './signing-panel';

/** Everything a signer looks at before a lot is released or rejected, and the place to sign. */
@Component({
  selector: 'qr-decision-page',
  imports: [
    CharacteristicResults,
    Loaded,
    LotDoubts,
    LotHead,
    LotHistory,
    MatButton,
    MeasuredWith,
    PageState,
    PlateOfLot,
    ReadOnlyNote,
    RouterLink,
    SampleSheet,
    SigningPanel,
  ],
  templateUrl: './decision-page.html',
  styleUrl: './decision-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DecisionPage {
  readonly id = input.required({ transform: numberAttribute });

  protected readonly assessment = endpointResource(readAssessment, () => ({ params: { id: this.id() } }));
  protected readonly plate = computed(() => {
    const shown = this.assessment.hasValue() ? this.assessment.value() : undefined;
    if (shown === undefined) return undefined;
    return shown.lot.status === 'submitted' ? plateToSign(shown) : lotPlate(shown.lot, shown.groups);
  });

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      if (this.assessment.hasValue()) title.show(this.assessment.value().lot.number);
    });
  }
}
