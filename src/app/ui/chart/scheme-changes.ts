import { DestroyRef, DOCUMENT, inject } from '@angular/core';

/** Calls back when the page turns light or dark, by the person's choice or the system's. Call it where injection is possible. */
export function onSchemeChange(changed: () => void): void {
  const page = inject(DOCUMENT);
  const system = page.defaultView?.matchMedia?.('(prefers-color-scheme: dark)');
  const observer = new MutationObserver(changed);
  observer.observe(page.documentElement, { attributeFilter: ['class'] });
  system?.addEventListener('change', changed);
  inject(DestroyRef).onDestroy(() => {
    observer.disconnect();
    system?.removeEventListener('change', changed);
  });
}
