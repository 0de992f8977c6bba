import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Icon } from '../marks/icon';

/** The person may not see this: who may, and how to ask. An action (a way back) may be given as content. */
@Component({
  selector: 'qr-no-permission',
  imports: [Icon],
  template: `
    <qr-icon name="lock" [size]="24" />
    <p class="title">{{ who() }}</p>
    <p class="quiet">{{ ask() }}</p>
    <div class="action"><ng-content /></div>
  `,
  styleUrl: './state.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NoPermission {
  /** A sentence: "Plans are written by quality engineers." */
  readonly who = input.required<string>();
  readonly ask = input('Ask an administrator when your work needs it.');
}
