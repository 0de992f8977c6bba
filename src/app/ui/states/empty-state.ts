import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** Nothing to show: a flat line, one sentence, what to do, and at most one action as content. */
@Component({
  selector: 'qr-empty-state',
  template: `
    <svg width="220" height="4" viewBox="0 0 220 4" aria-hidden="true"><path d="M0 2H220" /></svg>
    <p class="title">{{ title() }}</p>
    @if (text()) {
      <p class="quiet">{{ text() }}</p>
    }
    <div class="action"><ng-content /></div>
  `,
  styleUrl: './state.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmptyState {
  readonly title = input.required<string>();
  readonly text = input('');
}
