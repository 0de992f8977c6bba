import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Lot } from '#shared/contract/lots';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { lookOf } from '../../ui/verdict-look';

type DecidedLot = Lot['lastLots'][number];

/** The last decided lots of a part and supplier, newest last, each with its verdict. */
@Component({
  selector: 'qr-last-lots',
  imports: [RouterLink, VerdictMark],
  template: `
    <ol>
      @for (lot of lots(); track lot.id) {
        <li>
          <a [routerLink]="['/lots', lot.id]" [attr.aria-label]="lot.number + ' ' + lot.verdict">
            <qr-verdict-mark [look]="look(lot)" [size]="16" />
            <span class="mono">{{ lot.number.slice(-4) }}</span>
          </a>
        </li>
      }
    </ol>
    @if (lots().length === 0) {
      <p class="caption">None decided yet.</p>
    }
  `,
  styles: `
    ol {
      display: flex;
      gap: 20px;
      margin: 0;
      padding: 0;
      list-style: none;
    }
    a {
      display: flex;
      flex-direction: column;
      align-items: center;
      gap: 3px;
      min-width: 40px;
      font: var(--qr-t-caption);
      color: var(--qr-ink-2);
      text-decoration: none;
    }
    a:hover span {
      text-decoration: underline;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LastLots {
  readonly lots = input.required<readonly DecidedLot[]>();

  protected look(lot: DecidedLot) {
    return lookOf(lot.verdict);
  }
}
