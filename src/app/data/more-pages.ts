import { computed, linkedSignal, type Signal } from '@angular/core';
import { type Observable } from 'rxjs';
import { RecordSave } from './record-save';

interface Page<Item> {
  readonly items: readonly Item[];
  readonly next: string | null;
}

/**
 * The pages of a list after its first one, added at the person's wish. When the first page is loaded anew (another filter),
 * the list starts anew. Make it where injection is possible.
 */
export class MorePages<Item> {
  private readonly loading = new RecordSave();
  private readonly added: ReturnType<typeof linkedSignal<Page<Item>>>;

  readonly busy = this.loading.busy.asReadonly();
  readonly said = this.loading.said.asReadonly();
  readonly items: Signal<readonly Item[]>;
  readonly hasMore: Signal<boolean>;

  constructor(
    first: Signal<Page<Item> | undefined>,
    private readonly load: (after: string) => Observable<Page<Item>>,
  ) {
    this.added = linkedSignal<Page<Item>>(() => ({ items: [], next: first()?.next ?? null }));
    this.items = computed(() => [...(first()?.items ?? []), ...this.added().items]);
    this.hasMore = computed(() => this.added().next !== null);
  }

  more(): void {
    const { items, next } = this.added();
    if (next === null || this.busy()) return;
    this.loading.run(this.load(next), (page) => {
      // An answer to an earlier list is of no use to the one that is shown by now.
      if (this.added().items === items) this.added.set({ items: [...items, ...page.items], next: page.next });
    });
  }
}
