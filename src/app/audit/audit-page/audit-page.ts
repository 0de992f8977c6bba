import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { type AuditEntry, listAudit, verifyAudit } from '#shared/contract/audit';
import { ApiClient, endpointResource } from '../../data/api';
import { MorePages } from '../../data/more-pages';
import { may } from '../../session/may';
import { LoadMore } from '../../ui/load-more';
import { Loaded } from '../../ui/page-state/loaded';
import { PageState } from '../../ui/page-state/page-state';
import { EmptyState } from '../../ui/states/empty-state';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { sentenceCase } from '../../ui/values/sentence-case';
import { AuditDifference } from '../audit-difference/audit-difference';
import { shortId, subjectTitle } from '../audit-words';
import { AuditFilter, type AuditQuery } from './audit-filter';
import { ChainCheck } from './chain-check';

/** Who did what to what, when, with the values before and after; newest first. */
@Component({
  selector: 'qr-audit-page',
  imports: [AuditDifference, AuditFilter, ChainCheck, EmptyState, LoadMore, Loaded, MatButton, MomentPipe, PageState],
  templateUrl: './audit-page.html',
  styleUrl: './audit-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditPage {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);

  /** What the entries are about, from the query. */
  readonly subject = input<string>();
  readonly subjectId = input<string>();

  protected readonly mayCheck = may(verifyAudit);
  protected readonly query = computed<AuditQuery>(() => ({ subject: this.subject(), subjectId: this.subjectId() }));
  protected readonly filtered = computed(() => Boolean(this.subject()) || Boolean(this.subjectId()));
  protected readonly first = endpointResource(listAudit, () => ({ query: this.query() }));
  protected readonly pages = new MorePages<AuditEntry>(
    computed(() => (this.first.hasValue() ? this.first.value() : undefined)),
    (after) => this.api.call(listAudit, { query: { ...this.query(), after } }),
  );

  protected readonly subjectTitle = subjectTitle;
  protected readonly sentenceCase = sentenceCase;
  protected readonly shortId = shortId;

  protected filter(query: AuditQuery): void {
    const queryParams = { subject: query.subject || null, subjectId: query.subjectId || null };
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge' });
  }
}
