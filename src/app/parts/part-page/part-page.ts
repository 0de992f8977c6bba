import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { RouterLink } from '@angular/router';
import { changePart, FORM_TITLES, type Part, readPart } from '#shared/contract/parts';
import { addPlan, listPlans } from '#shared/contract/plans';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { ElectricalFacts } from '../../ui/electrical-facts';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { LoadingRows } from '../../ui/states/loading-rows';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { ExpectedOutputSheet } from '../expected-output/expected-output-sheet';
import { PartForm } from '../part-form/part-form';

/** One part: a form for quality, the values as text for everybody else, what it ought to give, and the way to its plan. */
@Component({
  selector: 'qr-part-page',
  imports: [
    BackLink,
    ElectricalFacts,
    ExpectedOutputSheet,
    Loaded,
    LoadingRows,
    MatButton,
    PageState,
    PartForm,
    ReadOnlyNote,
    RouterLink,
  ],
  templateUrl: './part-page.html',
  styleUrl: './part-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PartPage implements HoldsTyping {
  private readonly title = inject(PageTitle);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild(PartForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly part = endpointResource(readPart, () => ({ params: { id: this.id() } }));
  protected readonly mayChange = may(changePart);
  protected readonly mayPlan = may(addPlan);
  protected readonly mayReadPlans = may(listPlans);
  protected readonly forms = FORM_TITLES;

  constructor() {
    effect(() => {
      if (this.part.hasValue()) this.title.show(this.part.value().number);
    });
  }

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected show(part: Part): void {
    this.part.set(part);
    this.snackBar.open(`Part ${part.number} saved`);
  }
}
