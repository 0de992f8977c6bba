import { ChangeDetectionStrategy, Component, computed, effect, input, signal, untracked } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { INSTRUMENT_KIND_TITLES, INSTRUMENT_KINDS } from '#shared/contract/instruments';
import { type Measurand, MEASURAND_TITLES, MEASURANDS } from '#shared/contract/plans';
import { METHOD_NOTES } from '#shared/plan/method-notes';
import { isOfOneKind } from '#shared/plan/unit-faults';
import { INSPECTION_LEVELS } from '#shared/sampling/scheme';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { CharacteristicForm } from './characteristic-form';
import { ClassSelect } from './class-select';
import { showCharacteristicFaults, unreadFields } from './field-faults';
import { FormulaFields } from './formula-fields';
import { KindNote } from './kind-note';
import { LimitFields } from './limit-fields';
import { keyFromName, usualEntry } from './new-characteristic';
import { type PlanDraft } from './plan-draft';
import { UNIT_AQLS } from './unit-aqls';

/** The fields of the chosen characteristic; what is typed goes into the draft at once, its faults stand beside them. */
@Component({
  selector: 'qr-characteristic-fields',
  imports: [
    ClassSelect,
    FieldErrorPipe,
    FormulaFields,
    KindNote,
    LimitFields,
    MatFormFieldModule,
    MatInput,
    MatSelectModule,
    ReactiveFormsModule,
  ],
  templateUrl: './characteristic-fields.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CharacteristicFields {
  readonly draft = input.required<PlanDraft>();

  protected readonly form = new CharacteristicForm();
  protected readonly controls = this.form.group.controls;
  protected readonly levels = INSPECTION_LEVELS;
  protected readonly aqls = UNIT_AQLS;
  protected readonly instrumentKinds = INSTRUMENT_KINDS.map((kind) => ({ kind, title: INSTRUMENT_KIND_TITLES[kind] }));
  protected readonly measurands = MEASURANDS.map((measurand) => ({ measurand, title: MEASURAND_TITLES[measurand] }));
  protected readonly kind = computed(() => this.draft().selected()?.value.kind ?? 'measured');
  /** Which characteristic the fields show; a change of it alone, or of the whole content, fills them anew. */
  private readonly shown = signal<number | null>(null);

  private readonly measuredValue = computed(() => {
    const value = this.draft().selected()?.value;
    return value?.kind === 'measured' ? value : null;
  });
  /** Whether alternate peaks can differ in what is read: a ripple, off a screen. */
  protected readonly hasPeaks = computed(
    () => this.measuredValue()?.measurand === 'ripple' && this.measuredValue()?.entryMode === 'scope',
  );
  /** How this kind of quantity is measured, as the bench shows it. */
  protected readonly note = computed(() => METHOD_NOTES[this.measuredValue()?.measurand ?? 'other']);

  /** From the draft rather than the form, so that the fields that follow them are drawn anew. */
  protected readonly unit = computed(() => {
    const value = this.draft().selected()?.value;
    return value === undefined || value.kind === 'attribute' ? 'V' : value.unit;
  });
  protected readonly formula = computed(() => {
    const value = this.draft().selected()?.value;
    return value?.kind === 'computed' ? value.formula.key : 'load-regulation';
  });

  protected readonly measured = computed(() =>
    this.draft()
      .content()
      .characteristics.filter((each) => each.kind === 'measured'),
  );

  constructor() {
    effect(() => {
      this.draft().shownTimes();
      const id = this.draft().selectedId();
      untracked(() => this.show(id));
    });
    effect(() => {
      const index = this.draft().selectedIndex();
      const [faults, pressing] = [this.draft().faults(), this.draft().pressing()];
      this.shown();
      untracked(() => showCharacteristicFaults(this.form, index, faults, pressing));
    });
    this.form.group.valueChanges.pipe(takeUntilDestroyed()).subscribe(() => this.keep());
    this.controls.name.valueChanges.pipe(takeUntilDestroyed()).subscribe((name) => this.followName(name));
  }

  /** Another kind of measurement brings its usual instrument, and its usual unit where the present one is of something else. */
  protected choose(measurand: Measurand): void {
    const { unit, ...entry } = usualEntry(measurand);
    const keeps = unit === undefined || isOfOneKind(unit, this.controls.unit.value);
    this.form.group.patchValue(keeps ? entry : { ...entry, unit });
  }

  private show(id: number | null): void {
    const row = this.draft().selected();
    if (row === null) return;
    this.form.show(row.value);
    this.shown.set(id);
  }

  private keep(): void {
    const id = this.shown();
    if (id !== null) this.draft().change(id, this.form.value(this.kind()), unreadFields(this.form));
  }

  /** The key of a characteristic that is new in this draft follows its name until somebody types another one. */
  private followName(name: string): void {
    const before = this.draft().selected()?.value;
    const { key } = this.controls;
    if (before === undefined || this.draft().isStored(before.key)) return;
    if (key.value === keyFromName(before.name)) key.setValue(keyFromName(name), { emitEvent: false });
  }
}
