import { DestroyRef, ElementRef, inject, signal, type Signal } from '@angular/core';

/** The width of the component's own element in px, followed as it changes; `assumed` until it is known. */
export function elementWidth(assumed: number): Signal<number> {
  const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const width = signal(assumed);
  if (typeof ResizeObserver === 'undefined') return width;
  const observer = new ResizeObserver(([entry]) => {
    const measured = entry?.contentRect.width ?? 0;
    if (measured > 0) width.set(Math.round(measured));
  });
  observer.observe(element);
  inject(DestroyRef).onDestroy(() => observer.disconnect());
  return width;
}
