import { ChangeDetectionStrategy, Component, effect, inject, input, numberAttribute } from '@angular/core';
import { RouterLink } from '@angular/router';
import { readCertificate } from '#shared/contract/certificates';
import { endpointResource } from '../../data/api';
import { PageTitle } from '../../page-title';
import { BackLink } from '../../shell/back-link';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { CertificateStatus } from '../certificate-status';
import { OpenPdf } from '../open-pdf';

/** One certificate: what it covers, whether it holds, and the digests by which its file is known. */
@Component({
  selector: 'qr-certificate-page',
  imports: [BackLink, CertificateStatus, CountPipe, Loaded, MomentPipe, OpenPdf, PageState, RouterLink],
  templateUrl: './certificate-page.html',
  styles: `
    .digest {
      font: 400 13px/18px var(--qr-mono);
      overflow-wrap: anywhere;
    }
    .caption {
      margin-top: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CertificatePage {
  readonly id = input.required({ transform: numberAttribute });

  protected readonly certificate = endpointResource(readCertificate, () => ({ params: { id: this.id() } }));

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      if (this.certificate.hasValue()) title.show(this.certificate.value().number);
    });
  }
}
