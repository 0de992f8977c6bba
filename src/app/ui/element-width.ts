import { computed, DestroyRef, ElementRef, inject, signal, type Signal } from '@angular/core';

/**
 * The width of the component's own element in px, followed as it changes; `assumed` until it is known. It is measured from
 * the first time somebody asks for it, so that a piece which does not need it costs nothing.
 */
export function elementWidth(assumed: number): Signal<number> {
  const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const destroyed = inject(DestroyRef);
  const width = signal(assumed);
  let observer: ResizeObserver | undefined;
  const observe = () => {
    if (observer !== undefined || typeof ResizeObserver === 'undefined') return;
    observer = new ResizeObserver(([entry]) => {
      const measured = entry?.contentRect.width ?? 0;
      if (measured > 0) width.set(Math.round(measured));
    });
    observer.observe(element);
    destroyed.onDestroy(() => observer?.disconnect());
  };
  return computed(() => {
    observe();
    return width();
  });
}
