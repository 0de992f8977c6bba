import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { changeRack, type Rack, readRack } from '#shared/contract/racks';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { RackForm } from '../rack-form/rack-form';
import { lastUse } from '../token-use';
import { RackFacts } from './rack-facts';
import { RackTokens } from './rack-tokens';

/** One rack: its parts and columns, and the tokens with which it sends readings by itself. */
@Component({
  selector: 'qr-rack-page',
  imports: [BackLink, Loaded, MomentPipe, PageState, RackFacts, RackForm, RackTokens, ReadOnlyNote],
  templateUrl: './rack-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackPage implements HoldsTyping {
  private readonly title = inject(PageTitle);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild(RackForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly rack = endpointResource(readRack, () => ({ params: { id: this.id() } }));
  protected readonly mayChange = may(changeRack);
  protected readonly lastUse = lastUse;

  constructor() {
    effect(() => {
      if (this.rack.hasValue()) this.title.show(this.rack.value().name);
    });
  }

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected show(rack: Rack): void {
    this.rack.set(rack);
    this.snackBar.open(`Rack ${rack.name} saved`);
  }
}
