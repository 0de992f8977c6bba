import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type MessageHead } from '#shared/contract/mail';
import { VerdictChip } from '../ui/marks/verdict-chip';
import { type VerdictLook } from '../ui/verdict-look';

const LOOKS: Readonly<Record<MessageHead['status'], { look: VerdictLook; word: string }>> = {
  queued: { look: 'open', word: 'Waiting' },
  sent: { look: 'ok', word: 'Sent' },
  failed: { look: 'nok', word: 'Failed' },
};

/** Whether a message is on its way, sent or given up. */
@Component({
  selector: 'qr-message-status',
  imports: [VerdictChip],
  template: `<qr-verdict-chip [look]="shown().look" [word]="shown().word" />`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MessageStatus {
  readonly status = input.required<MessageHead['status']>();

  protected readonly shown = computed(() => LOOKS[this.status()]);
}
