import {
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { MatAutocompleteModule, type MatAutocompleteSelectedEvent } from '@angular/material/autocomplete';
import { Router } from '@angular/router';
import { catchError, debounceTime, map, of, switchMap } from 'rxjs';
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

/** Finds lots, parts, suppliers, certificates and nonconformances by number or name, and goes there. */
@Component({
  selector: 'qr-search-box',
  imports: [MatAutocompleteModule, Icon],
  templateUrl: './search-box.html',
  styleUrl: './search-box.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SearchBox {
  private readonly api = inject(ApiClient);
  private readonly router = inject(Router);
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  private readonly text = signal('');
  private readonly found = toSignal(
    toObservable(this.text).pipe(
      debounceTime(REST),
      switchMap((text) => (text === '' ? of(NOTHING) : this.ask(text))),
    ),
    { initialValue: NOTHING },
  );
  protected readonly hits = computed(() =>
    this.found().hits.map((hit) => ({ hit, kind: PLACES[hit.kind].title, key: `${hit.kind} ${hit.id}` })),
  );
  protected readonly note = computed(() => this.found().note);

  focus(): void {
    this.field().nativeElement.focus();
    this.field().nativeElement.select();
  }

  protected type(text: string): void {
    this.text.set(text.trim());
  }

  protected go({ option }: MatAutocompleteSelectedEvent): void {
    const hit = option.value as Hit;
    this.field().nativeElement.value = '';
    this.text.set('');
    void this.router.navigate([PLACES[hit.kind].path, hit.id]);
  }

  protected readonly textOf = (hit: Hit | string): string => (typeof hit === 'string' ? hit : hit.title);

  private ask(text: string) {
    return this.api.call(search, { query: { text } }).pipe(
      map(({ items }): Found => ({ hits: items, note: items.length === 0 ? 'Nothing found.' : '' })),
      catchError((thrown: unknown) => of<Found>({ hits: [], note: problemOf(thrown).message })),
    );
  }
}

const NOTHING: Found = { hits: [], note: '' };
