import { ChangeDetectionStrategy, Component, input, numberAttribute } from '@angular/core';
import { readReceived } from '#shared/contract/mail';
import { endpointResource } from '../../data/api';
import { BackLink } from '../../shell/back-link';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { MailBody } from '../mail-body';

/** One message as the local mail fake has received it. */
@Component({
  selector: 'qr-received-page',
  imports: [BackLink, Loaded, MailBody, MomentPipe, PageState],
  templateUrl: './received-page.html',
  styleUrl: '../message-layout.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReceivedPage {
  readonly id = input.required({ transform: numberAttribute });

  protected readonly message = endpointResource(readReceived, () => ({ params: { id: this.id() } }));
}
