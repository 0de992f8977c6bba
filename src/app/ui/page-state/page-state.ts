import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, contentChild, input, linkedSignal } from '@angular/core';
import { EmptyState } from '../states/empty-state';
import { LoadingRows } from '../states/loading-rows';
import { NoPermission } from '../states/no-permission';
import { ProblemNote } from '../states/problem-note';
import { Loaded } from './loaded';
import { failureOf } from './resource-like';

/**
 * The states of a page or a panel that shows one resource: loading, refused, not there, failed, filled.
 *
 *     <qr-page-state what="The queue" [rows]="8">
 *       <ng-template [qrLoaded]="queue" let-queue> … queue is the reply, typed … </ng-template>
 *     </qr-page-state>
 *
 * Import `PageState` and `Loaded`. The template also holds the page's own empty state, as only the page knows what to
 * offer there. A reload keeps what is shown; so does a failed reload while the server cannot be reached, since the shell
 * says that. `keepPrevious` keeps the last value also while a changed input (a filter, the next page) is loading.
 */
@Component({
  selector: 'qr-page-state',
  imports: [NgTemplateOutlet, EmptyState, LoadingRows, NoPermission, ProblemNote],
  templateUrl: './page-state.html',
  styles: `
    :host {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageState {
  /** Names the thing at the start of a sentence: "The queue" did not load. */
  readonly what = input.required<string>();
  /** Skeleton rows while loading, and their height in px. */
  readonly rows = input(6);
  readonly rowHeight = input(36);
  /** Who may see this, for a person who may not; the server's sentence is used otherwise. */
  readonly whoMay = input('');
  readonly keepPrevious = input(false);

  protected readonly loaded = contentChild.required(Loaded);

  private readonly current = computed(() => {
    const resource = this.loaded().qrLoaded();
    const status = resource.status();
    return { status, value: resource.hasValue() ? (resource.value() as unknown) : undefined, error: resource.error() };
  });

  private readonly kept = linkedSignal<{ status: string; value: unknown; error: Error | undefined }, unknown>({
    source: this.current,
    computation: (now, before) => {
      if (now.value !== undefined) return now.value;
      const unreached = now.error !== undefined && failureOf(now.error).status === 0;
      return unreached || (this.keepPrevious() && now.status === 'loading') ? before?.value : undefined;
    },
  });

  protected readonly failure = computed(() => {
    const { error } = this.current();
    return error === undefined || this.kept() !== undefined ? undefined : failureOf(error);
  });

  protected readonly context = computed(() => {
    const value = this.kept();
    return value === undefined || value === null ? undefined : { $implicit: value };
  });

  protected readonly loading = computed(() => {
    const { status } = this.current();
    return status === 'loading' || status === 'reloading';
  });

  protected retry(): void {
    this.loaded().qrLoaded().reload();
  }
}
