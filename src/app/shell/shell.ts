import {
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  Injector,
  signal,
  viewChild,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatMenuModule } from '@angular/material/menu';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router, RouterLink, RouterOutlet } from '@angular/router';
import { ROLE_TITLES } from '#shared/contract/roles';
import { readCounts } from '#shared/contract/counts';
import { readFront } from '#shared/contract/site';
import { resumeSending } from '../bench/waiting/resume-sending';
import { endpointResource } from '../data/api';
import { problemOf } from '../data/api-problem';
import { LiveCounts } from '../data/live-counts';
import { PageTitle } from '../page-title';
import { Session } from '../session/session';
import { Icon } from '../ui/marks/icon';
import { Mark } from '../ui/marks/mark';
import { Line } from './line/line';
import { OfflineBanner } from './offline-banner';
import { RecordsMenu } from './records-menu/records-menu';
import { Scheme } from './scheme';
import { narrowerThan } from './screen-width';
import { SearchBox } from './search-box/search-box';
import { STATIONS } from './stations';

/** The frame of every page behind sign-in: the line, search, records, the person, and the page itself. */
@Component({
  selector: 'qr-shell',
  imports: [
    RouterLink,
    RouterOutlet,
    MatButtonModule,
    MatMenuModule,
    Icon,
    Line,
    Mark,
    OfflineBanner,
    RecordsMenu,
    SearchBox,
  ],
  providers: [LiveCounts],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  host: { '(document:keydown)': 'press($event)', '[class.phone]': 'phone()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly snackBar = inject(MatSnackBar);
  private readonly content = viewChild.required<ElementRef<HTMLElement>>('content');
  private readonly search = viewChild(SearchBox);
  private readonly front = endpointResource(readFront, () => ({}));

  private readonly scheme = inject(Scheme);
  protected readonly title = inject(PageTitle).name;
  protected readonly compact = narrowerThan(1280);
  protected readonly phone = narrowerThan(600);
  protected readonly searching = signal(false);
  protected readonly me = this.session.me;
  protected readonly demo = computed(() => this.front.hasValue() && this.front.value().mode === 'demo');
  protected readonly role = computed(() => this.me()?.roles.map((role) => ROLE_TITLES[role])[0] ?? '');
  protected readonly dark = this.scheme.dark;

  constructor() {
    if (this.session.mayCall(readCounts)) inject(LiveCounts).follow();
    void resumeSending(inject(Injector));
  }

  protected skip(event: Event): void {
    event.preventDefault();
    this.content().nativeElement.focus();
  }

  protected toggleScheme(): void {
    this.scheme.choose(this.dark() ? 'light' : 'dark');
  }

  protected openSearch(): void {
    this.searching.set(true);
    setTimeout(() => this.search()?.focus());
  }

  /** The search row of a narrow screen closes when the focus leaves it with nothing typed. */
  protected closeSearch({ target, relatedTarget }: FocusEvent): void {
    const typed = target instanceof HTMLInputElement && target.value !== '';
    if (!typed && relatedTarget === null) this.searching.set(false);
  }

  protected signOut(): void {
    this.session.signOut().subscribe({
      error: (thrown: unknown) => this.snackBar.open(`You are still signed in. ${problemOf(thrown).message}`),
    });
  }

  private async showKeys(): Promise<void> {
    const { KeysDialog } = await import('./keys-dialog/keys-dialog');
    this.dialog.open(KeysDialog);
  }

  protected press(event: KeyboardEvent): void {
    const station =
      event.altKey && /^Digit[1-6]$/.test(event.code) ? STATIONS[Number(event.code.slice(5)) - 1] : undefined;
    if (station !== undefined) {
      event.preventDefault();
      void this.router.navigateByUrl(`/${station.key}`);
      return;
    }
    if (
      this.dialog.openDialogs.length > 0 ||
      event.defaultPrevented ||
      event.ctrlKey ||
      event.metaKey ||
      isTyping(event.target)
    )
      return;
    if (event.key === '/') {
      event.preventDefault();
      this.openSearch();
    } else if (event.key === '?') {
      event.preventDefault();
      void this.showKeys();
    }
  }
}

/** Whether a key belongs to the field the person is in. */
function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  return target.isContentEditable || target.closest('input, textarea, select') !== null;
}
