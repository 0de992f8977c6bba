import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { BenchSettings } from '../bench-settings';

/** The keys used most, under the grid. */
@Component({
  selector: 'qr-key-hints',
  template: `
    <span><kbd>Enter</kbd> keep, {{ next() }}</span>
    <span><kbd>Tab</kbd> next characteristic</span>
    @if (settings.letters()) {
      <span><kbd>P</kbd> <kbd>F</kbd> pass, fail</span>
      <span><kbd>R</kbd> repeat</span>
      <span><kbd>H</kbd> set aside</span>
      <span><kbd>N</kbd> note</span>
    }
    <button type="button" (click)="all.emit()"><kbd>?</kbd> all keys</button>
  `,
  styles: `
    :host {
      display: flex;
      flex: none;
      align-items: flex-start;
      gap: 22px;
      height: 30px;
      overflow: hidden;
      color: var(--qr-ink-2);
      font: var(--qr-t-caption);
      white-space: nowrap;
    }
    button {
      padding: 0;
      border: 0;
      background: none;
      color: inherit;
      font: inherit;
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KeyHints {
  protected readonly settings = inject(BenchSettings);
  readonly all = output();
  protected readonly next = computed(() => (this.settings.order() === 'by-unit' ? 'next characteristic' : 'next unit'));
}
