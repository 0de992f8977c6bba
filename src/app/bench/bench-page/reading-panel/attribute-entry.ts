import { ChangeDetectionStrategy, Component, ElementRef, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** A characteristic judged by eye: pass, or fail for one of the plan's reasons. */
@Component({
  selector: 'qr-attribute-entry',
  imports: [MatButton],
  template: `
    <p class="requirement">{{ requirement() }}</p>
    <div class="choices" role="group" aria-label="Judgement">
      <button
        type="button"
        [matButton]="pass() === true ? 'tonal' : 'outlined'"
        [attr.aria-pressed]="pass() === true"
        (click)="passed.emit()"
      >
        Pass <kbd aria-hidden="true">P</kbd>
      </button>
      <button
        type="button"
        [matButton]="pass() === false ? 'tonal' : 'outlined'"
        [attr.aria-pressed]="pass() === false"
        (click)="failed.emit()"
      >
        Fail <kbd aria-hidden="true">F</kbd>
      </button>
    </div>
    @if (asking() && reasons().length > 0) {
      <p class="label" id="fail-reason">What is wrong</p>
      <ol aria-labelledby="fail-reason">
        @for (reason of reasons(); track $index) {
          <li>
            <button type="button" matButton (click)="reasoned.emit(reason)">
              <kbd aria-hidden="true">{{ $index + 1 }}</kbd> {{ reason }}
            </button>
          </li>
        }
      </ol>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .requirement {
      margin-bottom: 10px;
      font: var(--qr-t-title-s);
      overflow-wrap: anywhere;
    }
    .choices {
      display: flex;
      gap: 8px;
    }
    .choices button {
      flex: 1;
    }
    .label {
      margin-top: 12px;
    }
    ol {
      display: grid;
      margin: 4px 0 0;
      padding: 0;
      list-style: none;
    }
    li button {
      width: 100%;
      justify-content: flex-start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AttributeEntry {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly requirement = input.required<string>();
  readonly reasons = input.required<readonly string[]>();
  /** What is judged: typed now, or kept. */
  readonly pass = input.required<boolean | null>();
  /** Whether the reason of a failure is asked for. */
  readonly asking = input(false);
  readonly passed = output();
  readonly failed = output();
  readonly reasoned = output<string>();

  focusFirst(): void {
    this.element.querySelector('button')?.focus();
  }
}
