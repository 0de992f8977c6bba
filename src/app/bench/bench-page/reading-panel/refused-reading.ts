import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { type Characteristic } from '#shared/contract/plans';
import { VerdictMark } from '../../../ui/marks/verdict-mark';
import { MessageNote } from '../../../ui/states/message-note';
import { MomentPipe } from '../../../ui/values/moment-pipe';
import { BenchActs } from '../../sheet/bench-acts';
import { type BenchReading } from '../../sheet/bench-reading';
import { BenchSheet } from '../../sheet/bench-sheet';
import { readingWords } from '../../sheet/reading-words';
import { type Confirmation } from '../../waiting/bench-act';
import { ReadingQueue } from '../../waiting/reading-queue';
import { PlausibilityQuestion } from './plausibility-question';

/**
 * A reading that the server did not take, with its sentence and the ways on. Where somebody else was there first both values
 * stand side by side; where it is far from what the part can give the question is asked again.
 */
@Component({
  selector: 'qr-refused-reading',
  imports: [MatButton, MessageNote, MomentPipe, PlausibilityQuestion, VerdictMark],
  templateUrl: './refused-reading.html',
  styleUrl: './refused-reading.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RefusedReading {
  private readonly acts = inject(BenchActs);
  private readonly queue = inject(ReadingQueue);
  private readonly sheet = inject(BenchSheet);

  readonly unit = input.required<number>();
  readonly reading = input.required<BenchReading>();
  /** The reading that counts in the cell. */
  readonly standing = input.required<BenchReading | undefined>();
  readonly characteristic = input.required<Characteristic>();
  /** The person repeats the reading with a reason, or corrects it. */
  readonly repeats = output<BenchReading>();
  readonly corrects = output<BenchReading>();

  protected readonly what = computed(() => readingWords(this.reading(), this.characteristic()));
  protected readonly code = computed(() => this.reading().refusal?.code ?? '');
  protected readonly why = computed(() => this.reading().refusal?.message ?? '');
  protected readonly sides = computed(() => {
    const standing = this.standing();
    if (this.code() !== 'reading-there-already' || standing === undefined) return null;
    return [
      { title: 'Kept', reading: standing, by: standing.takenBy ?? standing.rack ?? 'a rack' },
      { title: 'Yours', reading: this.reading(), by: this.sheet.takenBy() },
    ].map((each) => ({ ...each, value: readingWords(each.reading, this.characteristic()) }));
  });

  protected confirm(answer: Confirmation): void {
    this.acts.amend(this.reading().id, { question: { answer: 'confirmed', ...answer } });
  }

  protected resend(): void {
    this.queue.resend(this.reading().id);
  }

  protected discard(): void {
    this.acts.discardRefused(this.unit(), this.reading().id);
  }
}
