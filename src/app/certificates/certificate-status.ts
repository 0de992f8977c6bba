import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Certificate } from '#shared/contract/certificates';
import { VerdictChip } from '../ui/marks/verdict-chip';
import { type VerdictLook } from '../ui/verdict-look';

const LOOKS: Readonly<Record<Certificate['status'], { look: VerdictLook; word: string }>> = {
  issuing: { look: 'open', word: 'Being issued' },
  valid: { look: 'ok', word: 'Valid' },
  superseded: { look: 'hold', word: 'Superseded' },
  revoked: { look: 'nok', word: 'Revoked' },
};

/** Whether a certificate still holds. */
@Component({
  selector: 'qr-certificate-status',
  imports: [VerdictChip],
  template: `<qr-verdict-chip [look]="shown().look" [word]="shown().word" />`,
  styles: `
    qr-verdict-chip {
      font: 500 13px/18px var(--qr-sans);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CertificateStatus {
  readonly of = input.required<Certificate['status']>();

  protected readonly shown = computed(() => LOOKS[this.of()]);
}
