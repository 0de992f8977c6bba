import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  Injector,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import { assessReviewLot, type Review, REVIEW_EFFECT_TITLES, REVIEW_EFFECTS } from '#shared/contract/calibrations';
import { readCertificate } from '#shared/contract/certificates';
import { LOT_STATUS_TITLES, type LotStatus } from '#shared/contract/lots';
import { ApiClient } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { may } from '../../session/may';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { type VerdictLook } from '../../ui/verdict-look';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { DoubtfulReadings } from './doubtful-readings';

type Effect = (typeof REVIEW_EFFECTS)[number];
type Affected = Review['affected'][number];

const LOOKS: Readonly<Record<Effect, VerdictLook>> = { none: 'ok', 'measure-again': 'hold', recall: 'nok' };

/** One lot that a review puts in doubt: what rests on the instrument, and what quality says the doubt means. */
@Component({
  selector: 'qr-lot-assessment',
  imports: [
    CountPipe,
    DoubtfulReadings,
    FieldErrorPipe,
    MatButton,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    MessageNote,
    MomentPipe,
    ReactiveFormsModule,
    RouterLink,
    VerdictChip,
  ],
  templateUrl: './lot-assessment.html',
  styleUrl: './lot-assessment.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotAssessment {
  private readonly api = inject(ApiClient);
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly injector = inject(Injector);

  readonly review = input.required<Review>();
  readonly affected = input.required<Affected>();
  readonly changed = output<Review>();
  /** Somebody else changed the review first; it must be read again. */
  readonly overtaken = output();

  private readonly mayAssess = may(assessReviewLot);
  protected readonly mayReadCertificates = may(readCertificate);
  protected readonly editable = computed(() => this.mayAssess() && this.review().closedAt === null);
  protected readonly effects = REVIEW_EFFECTS.map((effect) => ({ effect, title: REVIEW_EFFECT_TITLES[effect] }));
  protected readonly titles = REVIEW_EFFECT_TITLES;
  protected readonly looks = LOOKS;
  protected readonly saving = new RecordSave();
  /** Whether what is said already is being changed. */
  protected readonly changing = signal(false);
  protected readonly isTyping = computed(() => this.editable() && (this.affected().effect === null || this.changing()));
  protected readonly readingsOpen = signal(false);
  protected readonly form = new FormGroup({
    effect: new FormControl<Effect | null>(null),
    note: new FormControl('', { nonNullable: true }),
  });
  protected readonly status = computed(() => LOT_STATUS_TITLES[this.affected().lot.status as LotStatus]);
  protected readonly nearWords = computed(() => {
    const { nearLimit } = this.affected();
    if (nearLimit === null)
      return 'How near they lie to limits is not known: the calibration has no point of their unit.';
    if (nearLimit === 0) return 'None so near a limit that the error found could have turned its verdict.';
    return `${nearLimit} so near a limit that the error found could have turned ${nearLimit === 1 ? 'its verdict' : 'their verdicts'}.`;
  });

  constructor() {
    effect(() => {
      const { effect: said, note } = this.affected();
      untracked(() => {
        // What is being typed here stays when another lot is assessed.
        if (!this.form.dirty) this.form.reset({ effect: said, note });
      });
    });
  }

  hasUnsaved(): boolean {
    return this.editable() && this.form.dirty;
  }

  /** Shows what is said as text again. The focus stays at this lot. */
  protected leave(): void {
    const { effect: said, note } = this.affected();
    this.form.reset({ effect: said, note });
    this.saving.said.set([]);
    this.changing.set(false);
    afterNextRender(() => this.element.nativeElement.querySelector<HTMLElement>('.change')?.focus(), {
      injector: this.injector,
    });
  }

  protected save(): void {
    const { id, version } = this.review();
    const lot = this.affected().lot.id;
    this.saving.submit(this.form, {
      schema: assessReviewLot.body,
      value: this.form.getRawValue(),
      call: (body) => this.api.call(assessReviewLot, { params: { id, lot }, body, version }),
      saved: (review) => {
        this.changed.emit(review);
        this.leave();
      },
      overtaken: () => {
        this.saving.said.set([
          'Somebody else worked on this review meanwhile. It is read again; what you typed stays.',
        ]);
        this.overtaken.emit();
      },
    });
  }
}
