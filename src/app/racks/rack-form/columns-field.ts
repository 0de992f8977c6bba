import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  Injector,
  input,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButtonModule } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { map, startWith, switchMap } from 'rxjs';
import { Icon } from '../../ui/marks/icon';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { type RackFields } from './rack-fields';

/** What the columns of a rack's files hold, row by row. */
@Component({
  selector: 'qr-columns-field',
  imports: [FieldErrorPipe, Icon, MatButtonModule, MatFormFieldModule, MatInput, ReactiveFormsModule],
  templateUrl: './columns-field.html',
  styleUrl: './columns-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnsField {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  readonly fields = input.required<RackFields>();

  protected readonly rows = computed(() => this.fields().rows());
  /** What is wrong with the rows, told anew at each event of theirs. */
  protected readonly errors = toSignal(
    toObservable(this.fields).pipe(
      switchMap(({ columns }) =>
        columns.events.pipe(
          startWith(null),
          map(() => (columns.touched ? columns.errors : null)),
        ),
      ),
    ),
  );

  protected add(): void {
    this.fields().addColumn();
    this.focusOn(() => this.headings().at(-1));
  }

  protected remove(index: number): void {
    this.fields().removeColumn(index);
    this.focusOn(
      () => this.headings()[Math.max(0, index - 1)] ?? this.element.nativeElement.querySelector<HTMLElement>('.add'),
    );
  }

  private focusOn(target: () => HTMLElement | null | undefined): void {
    afterNextRender(() => target()?.focus(), { injector: this.injector });
  }

  private headings(): HTMLElement[] {
    return [...this.element.nativeElement.querySelectorAll<HTMLElement>('input.heading')];
  }
}
