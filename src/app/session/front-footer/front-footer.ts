import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { type Front } from '#shared/contract/site';
import { Scheme, SCHEMES, type SchemeName } from '../../shell/scheme';
import { VerdictChip } from '../../ui/marks/verdict-chip';

/** Foot of the pages before sign-in: site, whether the server answers, mode, version, colour scheme. */
@Component({
  selector: 'qr-front-footer',
  imports: [VerdictChip],
  templateUrl: './front-footer.html',
  styleUrl: './front-footer.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FrontFooter {
  readonly front = input.required<Front | null>();
  readonly failed = input(false);

  protected readonly scheme = inject(Scheme);
  protected readonly schemes: readonly { name: SchemeName; title: string }[] = SCHEMES.map((name) => ({
    name,
    title: name.charAt(0).toUpperCase() + name.slice(1),
  }));

  protected readonly reached = computed(() => {
    if (this.front() !== null) return { look: 'ok', word: 'Server reached' } as const;
    if (this.failed()) return { look: 'nok', word: 'Server not reached' } as const;
    return { look: 'open', word: 'Looking for the server' } as const;
  });
}
