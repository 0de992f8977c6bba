import { ChangeDetectionStrategy, Component, computed, effect, input, model, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import {
  type Aql,
  INSPECTION_LEVELS,
  type InspectionLevel,
  NONCONFORMITY_CLASSES,
  SCHEME_NAME,
  SCHEME_TABLES,
} from '#shared/sampling/scheme';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { CountPipe } from '../../ui/values/count-pipe';
import { type PlanDraft } from './plan-draft';
import { groupsOf, lotSizesAlike } from './plan-sampling';
import { UNIT_AQLS } from './unit-aqls';

/** Level and AQLs of a plan, and what they ask of a lot of the size one types. */
@Component({
  selector: 'qr-sampling-sheet',
  imports: [ClassGlyph, CountPipe, MatFormFieldModule, MatInput, MatSelectModule, ReactiveFormsModule],
  templateUrl: './sampling-sheet.html',
  styleUrl: './sampling-sheet.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SamplingSheet {
  readonly draft = input.required<PlanDraft>();
  readonly editable = input.required<boolean>();
  readonly lotSize = model.required<number>();

  protected readonly classes = NONCONFORMITY_CLASSES;
  protected readonly levels = INSPECTION_LEVELS;
  protected readonly aqls = UNIT_AQLS;
  protected readonly scheme = `${SCHEME_NAME} (${SCHEME_TABLES}), single sampling, normal inspection`;

  protected readonly form = new FormGroup({
    level: new FormControl<InspectionLevel>('II', { nonNullable: true }),
    critical: new FormControl<Aql | null>(null),
    major: new FormControl<Aql | null>(null),
    minor: new FormControl<Aql | null>(null),
  });

  protected readonly groups = computed(() => groupsOf(this.draft().content(), this.lotSize()));
  protected readonly sizes = computed(() => lotSizesAlike(this.lotSize(), this.draft().settings().level));
  protected readonly faults = computed(() =>
    this.draft()
      .faults()
      .filter((fault) => fault.path[0] === 'classAqls' || fault.path[0] === 'level')
      .map((fault) => fault.message),
  );

  constructor() {
    effect(() => {
      this.draft().shownTimes();
      untracked(() => this.show());
    });
    this.form.valueChanges.pipe(takeUntilDestroyed()).subscribe(() => this.keep());
  }

  protected tryLotSize(text: string): void {
    const size = Number(text.replace(/\s/g, ''));
    if (Number.isSafeInteger(size) && size >= 1 && size <= 10_000_000) this.lotSize.set(size);
  }

  private show(): void {
    const { level, classAqls } = this.draft().settings();
    const aqlOf = (name: string) => classAqls.find((entry) => entry.class === name)?.aql ?? null;
    this.form.setValue(
      { level, critical: aqlOf('critical'), major: aqlOf('major'), minor: aqlOf('minor') },
      { emitEvent: false },
    );
  }

  private keep(): void {
    const { level, ...aqls } = this.form.getRawValue();
    const classAqls = NONCONFORMITY_CLASSES.flatMap((name) => {
      const aql = aqls[name];
      return aql === null ? [] : [{ class: name, aql }];
    });
    this.draft().changeSettings({ level, classAqls });
  }
}
