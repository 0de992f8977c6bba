import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Plan, type Revision } from '#shared/contract/plans';
import { ReadOnlyNote } from '../../ui/states/read-only-note';

/** Why a revision cannot be edited, and where the one that can be is. */
@Component({
  selector: 'qr-revision-standing',
  imports: [ReadOnlyNote, RouterLink],
  template: `
    @if (sentence(); as reason) {
      <qr-read-only-note>
        {{ reason }}
        @if (elsewhere(); as revision) {
          <a action class="link" [routerLink]="[]" [queryParams]="{ revision }">Open revision {{ revision }}</a>
        }
      </qr-read-only-note>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionStanding {
  readonly plan = input.required<Plan>();
  readonly shown = input.required<Revision>();
  readonly mayChange = input.required<boolean>();

  protected readonly sentence = computed(() => {
    const { revision, status } = this.shown();
    switch (status) {
      case 'effective':
        return `Revision ${revision} is in force and cannot be edited.`;
      case 'retired':
        return `Revision ${revision} is retired. Lots that were drawn under it keep it.`;
      case 'in-review':
        return `Revision ${revision} is in review and cannot be edited.`;
      case 'draft':
        return this.mayChange() ? '' : `Revision ${revision} is a draft. Plans are written by quality.`;
    }
  });

  protected readonly elsewhere = computed(() => {
    const open = this.plan().openRevision;
    return open === null || open.revision === this.shown().revision ? null : open.revision;
  });
}
