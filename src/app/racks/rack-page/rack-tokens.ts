import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { switchMap } from 'rxjs';
import { issueRackToken, type Rack, type RackToken, readRack, revokeRackToken } from '#shared/contract/racks';
import { ApiClient } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { may } from '../../session/may';
import { Confirm } from '../../ui/confirm/confirm';
import { MessageNote } from '../../ui/states/message-note';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { type IssuedToken, TokenDialog } from './token-dialog';

/** The tokens of a rack: who issued them, when they were used, and the ways to issue and revoke them. */
@Component({
  selector: 'qr-rack-tokens',
  imports: [MatButton, MessageNote, MomentPipe],
  templateUrl: './rack-tokens.html',
  host: { class: 'stack' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackTokens {
  private readonly api = inject(ApiClient);
  private readonly confirm = inject(Confirm);
  private readonly dialog = inject(MatDialog);

  readonly rack = input.required<Rack>();
  /** The rack as it is after a token was issued or revoked. */
  readonly changed = output<Rack>();

  protected readonly mayIssue = may(issueRackToken);
  protected readonly saving = new RecordSave();

  protected issue(): void {
    const { id } = this.rack();
    this.saving.run(this.api.call(issueRackToken, { params: { id } }), ({ token, rack }) => {
      this.changed.emit(rack);
      const data: IssuedToken = { rack: rack.name, token };
      // Only its button closes it: a stray click would lose the token for good.
      this.dialog.open(TokenDialog, { data, disableClose: true, autoFocus: '.token' });
    });
  }

  protected revoke({ id, beginning }: RackToken): void {
    const rackId = this.rack().id;
    const step = {
      title: `Revoke token ${beginning}…?`,
      text: [`From now on ${this.rack().name} cannot send readings with it. Readings sent before stay.`],
      confirm: 'Revoke token',
      destructive: true,
    };
    this.confirm.ask(step).subscribe((yes) => {
      if (!yes) return;
      const revoked = this.api
        .call(revokeRackToken, { params: { id: rackId, token: id } })
        .pipe(switchMap(() => this.api.call(readRack, { params: { id: rackId } })));
      this.saving.run(revoked, (rack) => this.changed.emit(rack));
    });
  }
}
