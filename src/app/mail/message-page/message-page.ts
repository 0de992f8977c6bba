import { ChangeDetectionStrategy, Component, input, numberAttribute } from '@angular/core';
import { readMessage } from '#shared/contract/mail';
import { endpointResource } from '../../data/api';
import { BackLink } from '../../shell/back-link';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { sentenceCase } from '../../ui/values/sentence-case';
import { MailBody } from '../mail-body';
import { MessageStatus } from '../message-status';

/** One queued message, each attempt to send it, and its bodies. */
@Component({
  selector: 'qr-message-page',
  imports: [BackLink, Loaded, MailBody, MessageStatus, MomentPipe, PageState, VerdictChip],
  templateUrl: './message-page.html',
  styleUrl: '../message-layout.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MessagePage {
  readonly id = input.required({ transform: numberAttribute });

  protected readonly sentenceCase = sentenceCase;
  protected readonly message = endpointResource(readMessage, () => ({ params: { id: this.id() } }));
}
