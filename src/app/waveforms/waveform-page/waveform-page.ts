import { ChangeDetectionStrategy, Component, computed, inject, input, linkedSignal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import {
  keepWaveform,
  moveWaveformPeaks,
  readWaveform,
  readWaveformFile,
  type Waveform,
  withdrawWaveform,
} from '#shared/contract/waveforms';
import { ApiClient, endpointResource, hrefOf } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { AskReason } from '../../shell/reason-dialog/ask-reason';
import { FigureBlock } from '../../ui/figure-block';
import { Icon } from '../../ui/marks/icon';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { formatQuantity } from '#shared/quantities/format-quantity';
import { FINDINGS } from '../finding-words';
import { PeakDraft } from './peak-draft';
import { PeakMover } from './peak-mover';
import { SpectrumChart } from './spectrum-chart';
import { WaveChart } from './wave-chart';
import { waveSamples } from './wave-samples';
import { WaveValues } from './wave-values';
import { WaveWindow } from './wave-window';

const volts = (value: number) => formatQuantity(value, 'V', { significant: 3 });

/** One waveform: drawn, with what was computed and found; its peaks are moved here, and it is withdrawn here. */
@Component({
  selector: 'qr-waveform-page',
  imports: [
    BackLink,
    FigureBlock,
    Icon,
    Loaded,
    MatButton,
    MessageNote,
    MomentPipe,
    PageState,
    PeakMover,
    RouterLink,
    SpectrumChart,
    VerdictMark,
    WaveChart,
    WaveValues,
  ],
  providers: [{ provide: WaveWindow, useFactory: () => new WaveWindow(inject(WaveformPage).sampleCount) }],
  templateUrl: './waveform-page.html',
  styleUrl: './waveform-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaveformPage implements HoldsTyping {
  private readonly api = inject(ApiClient);
  private readonly reasons = inject(AskReason);

  readonly waveform = input.required<string>();

  protected readonly shown = endpointResource(readWaveform, () => ({ params: { waveform: this.waveform() } }));
  protected readonly samples = waveSamples(this.waveform);
  protected readonly saving = new RecordSave();
  private readonly mayWrite = may(keepWaveform);
  /** Peaks, and whether it stands at all, may be changed while no reading rests on it. */
  protected readonly changeable = computed(() => {
    if (!this.shown.hasValue() || !this.mayWrite()) return false;
    const { withdrawn, lot, readingIds } = this.shown.value();
    return withdrawn === null && lot.atBench && readingIds.length === 0;
  });
  /** The peaks that are being moved; null while none are. It begins anew with every answer of the server. */
  protected readonly draft = linkedSignal<unknown, PeakDraft | null>({
    source: () => (this.shown.hasValue() ? this.shown.value() : null),
    computation: () => null,
  });
  protected readonly findings = computed(() =>
    this.shown.hasValue() ? this.shown.value().findings.map((one) => ({ ...one, ...FINDINGS[one.kind] })) : [],
  );
  protected readonly figures = computed(() => (this.shown.hasValue() ? figuresOf(this.shown.value()) : []));
  readonly sampleCount = (): number => (this.shown.hasValue() ? this.shown.value().samples : 0);

  hasUnsaved(): boolean {
    return this.draft()?.changed() ?? false;
  }

  protected file(): string {
    return hrefOf(readWaveformFile, { params: { waveform: this.waveform() } });
  }

  protected startMoving({ record }: Waveform): void {
    if (this.samples.hasValue()) this.draft.set(new PeakDraft(record, this.samples.value()));
  }

  protected savePeaks({ version }: Waveform, draft: PeakDraft): void {
    const body = { indices: [...draft.indices()] };
    const call = this.api.call(moveWaveformPeaks, { params: { waveform: this.waveform() }, body, version });
    this.saving.run(call, (waveform) => this.shown.set(waveform));
  }

  protected withdraw({ version, fileName }: Waveform): void {
    const step = {
      title: `Withdraw ${fileName}?`,
      text: ['The waveform stays on record with your reason. No reading can be taken from it any more.'],
      confirm: 'Withdraw',
      take: (reason: string) =>
        this.api.call(withdrawWaveform, { params: { waveform: this.waveform() }, body: { reason }, version }),
    };
    this.reasons.ask(step).subscribe(() => this.shown.reload());
  }
}

/** The three figures under the drawing. */
function figuresOf({ record }: Waveform): { value: string; caption: string }[] {
  const { peakToPeak, rippleHertz, alternateDifference, peaksPerCycle } = record.analysis;
  const alternate =
    alternateDifference === null
      ? { value: String(Number(peaksPerCycle.toFixed(2))), caption: 'peaks in a line cycle' }
      : { value: volts(alternateDifference), caption: 'between alternate peaks' };
  return [
    { value: volts(peakToPeak), caption: 'peak to peak' },
    ...(rippleHertz === null
      ? []
      : [
          {
            value: formatQuantity(rippleHertz, 'Hz'),
            caption: `ripple frequency, every ${formatQuantity(1 / rippleHertz, 's', { significant: 3 })}`,
          },
        ]),
    alternate,
  ];
}
