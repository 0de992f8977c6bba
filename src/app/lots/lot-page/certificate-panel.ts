import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { readCertificate } from '#shared/contract/certificates';
import { CertificateStatus } from '../../certificates/certificate-status';
import { OpenPdf } from '../../certificates/open-pdf';
import { endpointResource } from '../../data/api';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';

/** The certificate of a released lot, in short. */
@Component({
  selector: 'qr-certificate-panel',
  imports: [CertificateStatus, CountPipe, Loaded, MomentPipe, OpenPdf, PageState, RouterLink],
  template: `
    <qr-page-state what="The certificate" [rows]="3">
      <ng-template [qrLoaded]="certificate" let-certificate>
        @if (certificate) {
          <header>
            <h2>Certificate</h2>
            <a class="ident link" [routerLink]="['/certificates', certificate.id]">{{ certificate.number }}</a>
          </header>
          <dl class="kv">
            <dt>Status</dt>
            <dd><qr-certificate-status [of]="certificate.status" /></dd>
            <dt>Released</dt>
            <dd>{{ certificate.unitsReleased | count }} units</dd>
            <dt>Issued</dt>
            <dd>{{ certificate.issuedAt | moment }}, {{ certificate.issuedBy }}</dd>
          </dl>
          <qr-open-pdf [certificate]="certificate" />
        }
      </ng-template>
    </qr-page-state>
  `,
  styles: `
    header {
      display: flex;
      justify-content: space-between;
      align-items: baseline;
      margin-bottom: 8px;
    }
    qr-open-pdf {
      display: block;
      margin-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CertificatePanel {
  readonly certificateId = input.required<number>();

  protected readonly certificate = endpointResource(readCertificate, () => ({ params: { id: this.certificateId() } }));
}
