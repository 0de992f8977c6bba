import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type VerdictLook } from '../verdict-look';

/**
 * The mark of a verdict: ring with check, square with cross, diamond with two bars, dashed ring. Without `label` it is
 * hidden from screen readers, because the word stands beside it; in a cell without the word give the label.
 */
@Component({
  selector: 'qr-verdict-mark',
  templateUrl: './verdict-mark.html',
  styleUrl: './verdict-mark.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictMark {
  readonly look = input.required<VerdictLook>();
  /** Width and height in px, 12 to 36. */
  readonly size = input(14);
  readonly label = input('');
}
