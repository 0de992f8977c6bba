import { ChangeDetectionStrategy, Component, viewChild } from '@angular/core';
import { changeSite, readSite, type Site } from '#shared/contract/site';
import { endpointResource } from '../../data/api';
import { may } from '../../session/may';
import { type HoldsTyping } from '../../shell/leave-guard';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { ReadOnlyNote } from '../../ui/states/read-only-note';
import { SiteFacts } from './site-facts';
import { SiteForm } from './site-form';

/** The settings of the site: a form for the administrator, the values as text for the auditor. */
@Component({
  selector: 'qr-site-page',
  imports: [Loaded, PageState, ReadOnlyNote, SiteFacts, SiteForm],
  template: `
    <div class="page narrow">
      <header class="page-head">
        <div>
          <h1>Site</h1>
          <p>Whose inspection this is, and how it works here</p>
        </div>
      </header>
      <section class="sheet pad">
        <qr-page-state what="The site's settings">
          <ng-template [qrLoaded]="site" let-site>
            @if (site) {
              @if (mayChange()) {
                <qr-site-form [site]="site" (saved)="take($event)" />
              } @else {
                <div class="stack">
                  <qr-read-only-note>The site's settings are kept by an administrator.</qr-read-only-note>
                  <qr-site-facts [site]="site" />
                </div>
              }
            }
          </ng-template>
        </qr-page-state>
      </section>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SitePage implements HoldsTyping {
  private readonly form = viewChild(SiteForm);

  protected readonly site = endpointResource(readSite, () => ({}));
  protected readonly mayChange = may(changeSite);

  hasUnsaved(): boolean {
    return this.form()?.hasUnsaved() ?? false;
  }

  protected take(site: Site): void {
    this.site.set(site);
  }
}
