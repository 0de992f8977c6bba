import {
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  linkedSignal,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { Router } from '@angular/router';
import { catchError, debounceTime, map, type Observable, of, switchMap } from 'rxjs';
import { type Hit, search } from '#shared/contract/counts';
import { ApiClient } from '../../data/api';
import { problemOf } from '../../data/api-problem';
import { Icon } from '../../ui/marks/icon';

const PLACES: Readonly<Record<Hit['kind'], { path: string; title: string }>> = {
  lot: { path: '/lots', title: 'Lot' },
  part: { path: '/parts', title: 'Part' },
  supplier: { path: '/suppliers', title: 'Supplier' },
  certificate: { path: '/certificates', title: 'Certificate' },
  nonconformance: { path: '/nonconformances', title: 'Nonconformance' },
};

/** How long the typing rests before the server is asked, in ms. */
const REST = 180;

interface Found {
  readonly hits: readonly Hit[];
  readonly note: string;
}
const NOTHING: Found = { hits: [], note: '' };

let boxes = 0;

/** Finds lots, parts, suppliers, certificates and nonconformances by number or name, and goes there. */
@Component({
  selector: 'qr-search-box',
  imports: [Icon],
  templateUrl: './search-box.html',
  styleUrl: './search-box.scss',
  host: { '(keydown)': 'press($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SearchBox {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  /** A result was chosen, or the search given up. */
  readonly left = output();

  protected readonly listId = `qr-found-${++boxes}`;
  protected readonly text = signal('');
  private readonly found = toSignal(
    toObservable(computed(() => this.text().trim())).pipe(
      debounceTime(REST),
      switchMap((text) => (text === '' ? of(NOTHING) : this.ask(text))),
    ),
    { initialValue: NOTHING },
  );
  protected readonly results = computed(() =>
    this.found().hits.map((hit, index) => ({ hit, kind: PLACES[hit.kind].title, id: `${this.listId}-${index}` })),
  );
  protected readonly note = computed(() => this.found().note);
  protected readonly open = computed(() => this.text() !== '' && (this.results().length > 0 || this.note() !== ''));
  /** The result that Enter takes; the first one after each search. */
  protected readonly active = linkedSignal({ source: this.results, computation: () => 0 });

  focus(): void {
    this.field().nativeElement.focus();
    this.field().nativeElement.select();
  }

  protected go({ kind, id }: Hit): void {
    this.leave();
    void this.router.navigate([PLACES[kind].path, id]);
  }

  protected press(event: KeyboardEvent): void {
    const count = this.results().length;
    const chosen = this.results()[this.active()];
    if (event.key === 'ArrowDown' && count > 0) this.active.update((at) => (at + 1) % count);
    else if (event.key === 'ArrowUp' && count > 0) this.active.update((at) => (at + count - 1) % count);
    else if (event.key === 'Enter' && this.open() && chosen !== undefined) this.go(chosen.hit);
    else if (event.key === 'Escape') this.leave();
    else return;
    event.preventDefault();
  }

  private leave(): void {
    this.text.set('');
    this.left.emit();
  }

  private ask(text: string): Observable<Found> {
    return this.api.call(search, { query: { text } }).pipe(
      map(({ items }) => ({ hits: items, note: items.length === 0 ? 'Nothing found.' : '' })),
      catchError((thrown: unknown) => of({ hits: [], note: problemOf(thrown).message })),
    );
  }
}
