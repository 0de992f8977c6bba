import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router } from '@angular/router';
import { reopenLot } from '#shared/contract/bench';
import { type Assessment, decideLot } from '#shared/contract/decision';
import { ApiClient } from '../../data/api';
import { AskReason } from '../../shell/reason-dialog/ask-reason';
import { Session } from '../../session/session';
import { may } from '../../session/may';
import { MessageNote } from '../../ui/states/message-note';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { type Signing, SignDialog } from './sign-dialog';
import { signingWords } from './signing-words';

/** What may be decided about a submitted lot, and what stands against it. */
@Component({
  selector: 'qr-signing-panel',
  imports: [MatButton, MessageNote, ReadOnlyNote],
  templateUrl: './signing-panel.html',
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
    .actions button {
      flex: 1 1 auto;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SigningPanel {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly reasons = inject(AskReason);
  private readonly me = inject(Session).me;

  readonly assessment = input.required<Assessment>();
  /** The lot may be another by now than the one that is shown. */
  readonly overtaken = output();

  protected readonly maySign = may(decideLot);
  protected readonly words = computed(() => signingWords(this.assessment()));
  /** A rejection is signed by anybody of quality; a release is not, when all readings are the signer's own. */
  protected readonly objection = computed(() => {
    const { verdict, objection } = this.assessment();
    return verdict === 'accepted' ? objection : null;
  });

  protected sign(kind: Signing['kind']): void {
    const stamp = this.me()?.stampNumber ?? null;
    this.dialog
      .open<SignDialog, Signing, 'signed' | 'overtaken'>(SignDialog, {
        data: { kind, assessment: this.assessment(), stamp },
        autoFocus: '.cancel',
      })
      .afterClosed()
      .subscribe((outcome) => {
        const lot = this.assessment().lot;
        if (outcome === 'overtaken') this.overtaken.emit();
        if (outcome === 'signed') void this.router.navigate(['/lots', lot.id], { queryParams: { signed: kind } });
      });
  }

  protected reopen(): void {
    const { id, version, number } = this.assessment().lot;
    const step = {
      title: `Send ${number} back to the bench?`,
      text: ['The readings stay as they are. The inspector goes on measuring and submits the lot again.'],
      confirm: 'Back to the bench',
      take: (reason: string) => this.api.call(reopenLot, { params: { id }, body: { reason }, version }),
    };
    this.reasons.ask(step).subscribe((taken) => {
      if (taken) void this.router.navigate(['/decision']);
      else this.overtaken.emit();
    });
  }
}
