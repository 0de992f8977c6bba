import { computed, DOCUMENT, inject, Injectable, signal } from '@angular/core';

export const SCHEMES = ['light', 'dark', 'system'] as const;
export type SchemeName = (typeof SCHEMES)[number];

/** The key that `scheme.js` reads before the first paint. */
const KEY = 'quietrail.scheme';

/** Light, dark, or what the system has; remembered in this browser. */
@Injectable({ providedIn: 'root' })
export class Scheme {
  private readonly page = inject(DOCUMENT);
  private readonly chosen = signal<SchemeName>(this.remembered());

  private readonly systemDark = signal(false);

  readonly name = this.chosen.asReadonly();
  /** Whether the page is dark at this moment, by choice or by the system. */
  readonly dark = computed(() => this.chosen() === 'dark' || (this.chosen() === 'system' && this.systemDark()));

  constructor() {
    const system = this.page.defaultView?.matchMedia?.('(prefers-color-scheme: dark)');
    this.systemDark.set(system?.matches ?? false);
    system?.addEventListener('change', ({ matches }) => this.systemDark.set(matches));
  }

  choose(name: SchemeName): void {
    this.chosen.set(name);
    this.page.documentElement.classList.remove('light', 'dark');
    if (name !== 'system') this.page.documentElement.classList.add(name);
    this.remember(name);
  }

  private remembered(): SchemeName {
    const { classList } = this.page.documentElement;
    return SCHEMES.find((name) => classList.contains(name)) ?? 'system';
  }

  private remember(name: SchemeName): void {
    try {
      localStorage.setItem(KEY, name);
    } catch {
      // Where storage is forbidden the choice holds until the page is left.
    }
  }
}
