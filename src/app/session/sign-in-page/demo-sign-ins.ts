import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { type Role, ROLE_TITLES } from '#shared/contract/roles';
import { type Front } from '#shared/contract/site';

type DemoSignIn = Front['signIns'][number];

/** The sign-ins of the demo; each fills both fields. */
@Component({
  selector: 'qr-demo-sign-ins',
  template: `
    <h3>Demo: choose a person</h3>
    <div>
      @for (person of people(); track person.email) {
        <button type="button" (click)="chosen.emit(person)">
          <b>{{ person.name }}</b>
          <span>{{ titles(person.roles) }}</span>
        </button>
      }
    </div>
  `,
  styles: `
    :host {
      display: block;
      border-top: 1px solid var(--qr-line);
      padding-top: 12px;
    }
    h3 {
      font: var(--qr-t-label);
      color: var(--qr-ink-2);
      margin-bottom: 6px;
    }
    div {
      display: grid;
      grid-template-columns: 1fr 1fr;
      gap: 6px;
    }
    button {
      display: grid;
      min-height: 44px;
      padding: 5px 10px;
      border: 1px solid var(--qr-line);
      border-radius: var(--qr-r-control);
      background: none;
      color: var(--qr-primary);
      font: var(--qr-t-small);
      text-align: left;
      cursor: pointer;
    }
    button:hover {
      background: var(--qr-row-focus);
    }
    span {
      font: var(--qr-t-caption);
      color: var(--qr-ink-3);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DemoSignIns {
  readonly people = input.required<readonly DemoSignIn[]>();
  readonly chosen = output<DemoSignIn>();

  protected titles(roles: readonly Role[]): string {
    return roles.map((role) => ROLE_TITLES[role]).join(', ');
  }
}
