import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Plan } from '#shared/contract/plans';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { STATUS_WORDS } from '../revision-status';

/** All revisions of a plan, newest first, and who wrote and approved them. */
@Component({
  selector: 'qr-revision-list',
  imports: [MomentPipe, RouterLink],
  templateUrl: './revision-list.html',
  styles: `
    h2 {
      margin-bottom: 6px;
    }
    td {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionList {
  readonly plan = input.required<Plan>();
  readonly shown = input.required<number>();

  protected readonly statusWords = STATUS_WORDS;
}
