import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type GaugeStudy } from '#shared/contract/gauge-studies';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { StudyForm } from '../study-form/study-form';

/** Begins a gauge study and opens it. */
@Component({
  selector: 'qr-new-gauge-study-page',
  imports: [BackLink, StudyForm],
  template: `
    <header class="record-head">
      <qr-back-link to="/gauge-studies">Gauge studies</qr-back-link>
      <h1>New gauge study</h1>
    </header>
    <div class="page narrow">
      <section class="sheet pad"><qr-study-form (saved)="open($event)" /></section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewGaugeStudyPage implements HoldsTyping {
  private readonly router = inject(Router);
  private readonly snackBar = inject(MatSnackBar);
  private readonly form = viewChild.required(StudyForm);

  hasUnsaved(): boolean {
    return this.form().hasUnsaved();
  }

  protected open(study: GaugeStudy): void {
    this.snackBar.open(`Gauge study ${study.number} begun`);
    void this.router.navigate(['/gauge-studies', study.id], { replaceUrl: true });
  }
}
