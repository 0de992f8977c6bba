import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listCertificates } from '#shared/contract/certificates';
import { endpointResource } from '../../data/api';
import { PageLinks } from '../../shell/page-links';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { PartName } from '../../ui/part-name';
import { CountPipe } from '../../ui/values/count-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { CertificateStatus } from '../certificate-status';

/** All certificates of conformance, newest first. */
@Component({
  selector: 'qr-certificate-list-page',
  imports: [CertificateStatus, CountPipe, EmptyState, Loaded, MomentPipe, PageLinks, PageState, PartName, RouterLink],
  templateUrl: './certificate-list-page.html',
  styles: `
    .name {
      max-width: 340px;
      overflow-wrap: break-word;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CertificateListPage {
  readonly after = input<string>();

  protected readonly certificates = endpointResource(listCertificates, () => ({ query: { after: this.after() } }));
}
