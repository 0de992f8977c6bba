import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

/** Skeleton of a table: bars at the height of the rows to come, shown after 300 ms so that a quick answer does not flicker. */
@Component({
  selector: 'qr-loading-rows',
  template: `
    <span class="unseen">{{ label() }} is loading.</span>
    @for (row of bars(); track $index) {
      <div class="bars" [style.height.px]="height()" aria-hidden="true">
        @for (width of row; track $index) {
          <i [style.width.%]="width"></i>
        }
      </div>
    }
  `,
  styleUrl: './loading-rows.scss',
  host: { role: 'status', 'aria-busy': 'true' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LoadingRows {
  readonly rows = input(6);
  /** Height of one row in px. */
  readonly height = input(36);
  readonly label = input('The page');

  protected readonly bars = computed(() =>
    Array.from({ length: this.rows() }, (_, row) => [14, 18 + ((row * 7) % 11), 12, 10]),
  );
}
