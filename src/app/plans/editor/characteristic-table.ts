import { LiveAnnouncer } from '@angular/cdk/a11y';
import { CdkDrag, type CdkDragDrop, CdkDragHandle, CdkDragPreview, CdkDropList } from '@angular/cdk/drag-drop';
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
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { Icon } from '../../ui/marks/icon';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { characteristicLine } from './characteristic-line';
import { type PlanDraft } from './plan-draft';
import { groupsOf } from './plan-sampling';

/** The characteristics of a plan in the order of the bench; one is chosen, and where it may be edited, each can be moved. */
@Component({
  selector: 'qr-characteristic-table',
  imports: [CdkDrag, CdkDragHandle, CdkDragPreview, CdkDropList, ClassGlyph, Icon, VerdictMark],
  templateUrl: './characteristic-table.html',
  styleUrl: './characteristic-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CharacteristicTable {
  private readonly announcer = inject(LiveAnnouncer);
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  readonly draft = input.required<PlanDraft>();
  readonly editable = input.required<boolean>();
  /** Units of the lot that n is shown for. */
  readonly lotSize = input.required<number>();

  private readonly groups = computed(() => groupsOf(this.draft().content(), this.lotSize()));

  protected readonly lines = computed(() => {
    const content = this.draft().content();
    const faulty = new Set(
      this.draft()
        .faults()
        .filter((fault) => fault.path[0] === 'characteristics')
        .map((fault) => fault.path[1]),
    );
    return this.draft()
      .rows()
      .map((row, index) => ({
        id: row.id,
        characteristic: row.value,
        ...characteristicLine(row.value, content, this.groups()),
        faulty: this.editable() && faulty.has(index),
      }));
  });

  protected choose(id: number): void {
    this.draft().selectedId.set(id);
  }

  protected drop(event: CdkDragDrop<unknown>): void {
    this.draft().move(event.previousIndex, event.currentIndex);
  }

  /** Alt and an arrow move the characteristic, and the focus with it. */
  protected moveBy(event: Event, index: number, step: number): void {
    event.preventDefault();
    if (!this.editable() || !this.draft().move(index, index + step)) return;
    const name = this.lines()[index + step]?.characteristic.name ?? '';
    void this.announcer.announce(`${name} is now number ${index + step + 1} of ${this.lines().length}.`);
    afterNextRender(() => this.focusRow(index + step), { injector: this.injector });
  }

  private focusRow(index: number): void {
    this.element.nativeElement.querySelectorAll<HTMLElement>('button.pick')[index]?.focus();
  }
}
