import { DestroyRef, Directive, ElementRef, inject, input, signal } from '@angular/core';

/** A place whose content may be wider or higher than it: reached with the keyboard while it scrolls, and only then. */
@Directive({
  selector: '[qrScrollRegion]',
  host: {
    class: 'scroll-x',
    '[attr.tabindex]': 'scrolls() ? 0 : null',
    '[attr.role]': "scrolls() ? 'region' : null",
    '[attr.aria-label]': 'scrolls() ? qrScrollRegion() : null',
  },
})
export class ScrollRegion {
  /** What is in it: "Readings that count". */
  readonly qrScrollRegion = input.required<string>();

  protected readonly scrolls = signal(false);

  constructor() {
    const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    if (typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => {
      const wide = element.scrollWidth > element.clientWidth;
      this.scrolls.set(wide || element.scrollHeight > element.clientHeight);
    });
    observer.observe(element);
    inject(DestroyRef).onDestroy(() => observer.disconnect());
  }
}
