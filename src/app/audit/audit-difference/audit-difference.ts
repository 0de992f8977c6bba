import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { entryChanges } from './entry-changes';

/** Lines shown before the rest is asked for. */
const SHOWN_AT_ONCE = 4;

/** What an audit entry changed, value by value. */
@Component({
  selector: 'qr-audit-difference',
  template: `
    <ul>
      @for (change of listed(); track change.name) {
        <li>
          <span class="quiet">{{ change.name }}</span>
          @if (change.before !== null) {
            <s>{{ change.before || 'empty' }}</s>
          }
          @if (change.after !== null) {
            <b>{{ change.after || 'empty' }}</b>
          } @else {
            <span class="quiet">taken away</span>
          }
        </li>
      }
    </ul>
    @if (hidden() > 0 || all()) {
      <button type="button" class="link" [attr.aria-expanded]="all()" (click)="all.set(!all())">
        {{ all() ? 'Show less' : hidden() + ' more' }}
      </button>
    }
  `,
  styles: `
    ul {
      display: grid;
      gap: 2px;
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      flex-wrap: wrap;
      gap: 0 8px;
      overflow-wrap: anywhere;
    }
    s {
      color: var(--qr-ink-3);
    }
    b,
    s {
      min-width: 0;
    }
    button {
      min-height: 24px;
      padding: 0;
      border: 0;
      background: none;
      font: var(--qr-t-label);
      cursor: pointer;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditDifference {
  readonly before = input.required<unknown>();
  readonly after = input.required<unknown>();

  protected readonly all = signal(false);
  private readonly changes = computed(() => entryChanges(this.before(), this.after()));
  protected readonly listed = computed(() => (this.all() ? this.changes() : this.changes().slice(0, SHOWN_AT_ONCE)));
  protected readonly hidden = computed(() => this.changes().length - this.listed().length);
}
