import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import {
  changeInstrument,
  type Instrument,
  INSTRUMENT_KIND_TITLES,
  readInstrument,
} from '#shared/contract/instruments';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { InstrumentDue } from '../../ui/marks/instrument-due';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { InstrumentForm } from '../instrument-form/instrument-form';
import { InstrumentFacts } from './instrument-facts';

/** One instrument: a form for quality, the values as text for everybody else. */
@Component({
  selector: 'qr-instrument-page',
  imports: [BackLink, InstrumentDue, InstrumentFacts, InstrumentForm, Loaded, PageState, ReadOnlyNote],
  templateUrl: './instrument-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InstrumentPage implements HoldsTyping {
  private readonly title = inject(PageTitle);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild(InstrumentForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly instrument = endpointResource(readInstrument, () => ({ params: { id: this.id() } }));
  protected readonly mayChange = may(changeInstrument);
  protected readonly kinds = INSTRUMENT_KIND_TITLES;

  constructor() {
    effect(() => {
      if (this.instrument.hasValue()) this.title.show(this.instrument.value().assetNumber);
    });
  }

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected show(instrument: Instrument): void {
    this.instrument.set(instrument);
    this.snackBar.open(`Instrument ${instrument.assetNumber} saved`);
  }
}
