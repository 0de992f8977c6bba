import { afterNextRender, DestroyRef, type ElementRef, inject, signal, type Signal } from '@angular/core';

/** Size of the grid's view and height of one of its rows, in px. */
export interface ViewSize {
  readonly width: number;
  readonly height: number;
  readonly row: number;
}

/** The size of a scrolled view, followed as it changes; the row height is the theme's, larger on a coarse pointer. */
export function viewSize(view: Signal<ElementRef<HTMLElement>>): Signal<ViewSize> {
  const size = signal<ViewSize>({ width: 980, height: 600, row: 30 });
  const destroyed = inject(DestroyRef);
  afterNextRender(() => {
    const element = view().nativeElement;
    const measure = () => {
      const row = parseFloat(getComputedStyle(element).getPropertyValue('--qr-row'));
      const { clientWidth: width, clientHeight: height } = element;
      if (width > 0) size.set({ width, height, row: row > 0 ? row : 30 });
    };
    measure();
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    destroyed.onDestroy(() => observer.disconnect());
  });
  return size;
}
