import { ChangeDetectionStrategy, Component, computed, effect, inject, input, numberAttribute } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { readBench } from '#shared/contract/bench';
import { liftHold, readAssessment } from '#shared/contract/decision';
import { type Lot, readLot } from '#shared/contract/lots';
import { readCertificate } from '#shared/contract/certificates';
import { readNonconformance } from '#shared/contract/nonconformances';
import { listWaveforms } from '#shared/contract/waveforms';
import { ApiClient, endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { CharacteristicResults } from '../evidence/characteristic-results';
import { LotHead } from '../evidence/lot-head';
import { LotHistory } from '../evidence/lot-history';
import { lotPlate } from '../evidence/lot-plate';
import { MeasuredWith } from '../evidence/measured-with';
import { PlateOfLot } from '../evidence/plate-of-lot';
import { SampleSheet } from '../evidence/sample-sheet';
import { SamplingFacts } from '../evidence/sampling-facts';
import { LotDoubts } from '../../reviews/lot-doubts';
import { AskReason } from '../../shell/reason-dialog/ask-reason';
import { LotWaveformsPanel } from '../../waveforms/lot-waveforms-panel';
import { CertificatePanel } from './certificate-panel';
import { LotFacts } from './lot-facts';
import { NonconformancePanel } from './nonconformance-panel';
import { placeOf } from './lot-place';

/** One lot, wherever it stands: its verdict, what the sample showed, its papers and its history. */
@Component({
  selector: 'qr-lot-page',
  imports: [
    CertificatePanel,
    CharacteristicResults,
    Loaded,
    LotDoubts,
    LotFacts,
    LotHead,
    LotHistory,
    LotWaveformsPanel,
    MatButton,
    MeasuredWith,
    MessageNote,
    NonconformancePanel,
    PageState,
    PlateOfLot,
    RouterLink,
    SampleSheet,
    SamplingFacts,
  ],
  templateUrl: './lot-page.html',
  styleUrl: './lot-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotPage {
  private readonly api = inject(ApiClient);
  private readonly reasons = inject(AskReason);
  private readonly mayAssess = may(readAssessment);

  readonly id = input.required({ transform: numberAttribute });
  /** Given on the way from the decision, so that the plate settles once. */
  readonly signed = input<string>();

  protected readonly lot = endpointResource(readLot, () => ({ params: { id: this.id() } }));
  private readonly drawn = computed(() => this.lot.hasValue() && this.lot.value().drawnAt !== null);
  protected readonly assessment = endpointResource(readAssessment, () =>
    this.drawn() && this.mayAssess() ? { params: { id: this.id() } } : undefined,
  );
  protected readonly plate = computed(() =>
    this.lot.hasValue()
      ? lotPlate(this.lot.value(), this.assessment.hasValue() ? this.assessment.value().groups : undefined)
      : undefined,
  );
  protected readonly assessed = computed(() => this.drawn() && this.mayAssess());
  protected readonly mayMeasure = may(readBench);
  protected readonly mayLift = may(liftHold);
  protected readonly mayReadCertificate = may(readCertificate);
  protected readonly mayReadWaveforms = may(listWaveforms);
  protected readonly mayReadNonconformance = may(readNonconformance);
  protected readonly placeOf = placeOf;

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      if (this.lot.hasValue()) title.show(this.lot.value().number);
    });
  }

  protected lift(lot: Lot): void {
    const { id, version, number } = lot;
    const step = {
      title: `End the hold of ${number}?`,
      text: ['The lot goes back to decision, where its verdict can be signed.'],
      confirm: 'Back to decision',
      take: (reason: string) => this.api.call(liftHold, { params: { id }, body: { reason }, version }),
    };
    this.reasons.ask(step).subscribe(() => this.lot.reload());
  }
}
