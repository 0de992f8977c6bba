import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  numberAttribute,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { changeGaugeStudy, type GaugeStudy, readGaugeStudy } from '#shared/contract/gauge-studies';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { may } from '../../session/may';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { ConflictNote } from '../../ui/conflict-note';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MessageNote } from '../../ui/states/message-note';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { StudyStatus } from '../study-status';
import { ReadingsEntry } from './readings-entry';
import { ReadingsTable } from './readings-table';
import { StudyFacts } from './study-facts';
import { StudyPdf } from './study-pdf';
import { StudyResults } from './study-results';
import { StudyWork } from './study-work';
import { VerdictSheet } from './verdict-sheet';

/** One gauge study: its readings are entered while it is open, and its results stand as soon as none is missing. */
@Component({
  selector: 'qr-gauge-study-page',
  imports: [
    BackLink,
    ConflictNote,
    Loaded,
    MatButton,
    MessageNote,
    PageState,
    ReadingsEntry,
    ReadingsTable,
    ReadOnlyNote,
    RouterLink,
    StudyFacts,
    StudyPdf,
    StudyResults,
    StudyStatus,
    VerdictSheet,
  ],
  providers: [StudyWork],
  templateUrl: './gauge-study-page.html',
  styleUrl: './gauge-study-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GaugeStudyPage implements HoldsTyping {
  private readonly title = inject(PageTitle);

  readonly id = input.required({ transform: numberAttribute });

  protected readonly work = inject(StudyWork);
  protected readonly study = endpointResource(readGaugeStudy, () => ({ params: { id: this.id() } }));
  private readonly mayChange = may(changeGaugeStudy);
  protected readonly editable = computed(
    () => this.mayChange() && this.study.hasValue() && this.study.value().status === 'open',
  );

  constructor() {
    effect(() => {
      if (!this.study.hasValue()) return;
      const study = this.study.value();
      untracked(() => {
        this.title.show(study.number);
        this.work.show(study);
      });
    });
  }

  hasUnsaved(): boolean {
    return this.editable() && this.work.changed();
  }

  protected readonly take = (study: GaugeStudy): void => this.study.set(study);
}
