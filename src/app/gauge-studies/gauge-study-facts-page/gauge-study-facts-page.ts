import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type GaugeStudy, readGaugeStudy } from '#shared/contract/gauge-studies';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { StudyForm } from '../study-form/study-form';

/** Changes what an open gauge study is about, and goes back to it. */
@Component({
  selector: 'qr-gauge-study-facts-page',
  imports: [BackLink, Loaded, PageState, ReadOnlyNote, StudyForm],
  template: `
    <qr-page-state what="The gauge study">
      <ng-template [qrLoaded]="study" let-study>
        @if (study) {
          <header class="record-head">
            <qr-back-link [to]="'/gauge-studies/' + study.id">{{ study.number }}</qr-back-link>
            <h1>Change gauge study</h1>
          </header>
          <div class="page narrow">
            <section class="sheet pad">
              @if (study.status === 'open') {
                <qr-study-form [study]="study" (saved)="close($event)" />
              } @else {
                <qr-read-only-note>{{ study.number }} is closed; it changes no more.</qr-read-only-note>
              }
            </section>
          </div>
        }
      </ng-template>
    </qr-page-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GaugeStudyFactsPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly title = inject(PageTitle);
  private readonly form = viewChild(StudyForm);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly study = endpointResource(readGaugeStudy, () => ({ params: { id: this.id() } }));

  constructor() {
    effect(() => {
      if (this.study.hasValue()) this.title.show(this.study.value().number);
    });
  }

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected close(study: GaugeStudy): void {
    this.snackBar.open(`Gauge study ${study.number} saved`);
    void this.router.navigate(['/gauge-studies', study.id], { replaceUrl: true });
  }
}
