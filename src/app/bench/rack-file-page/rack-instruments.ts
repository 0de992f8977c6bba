import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
} from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { type Bench } from '#shared/contract/bench';
import { INSTRUMENT_KIND_TITLES, type InstrumentKind } from '#shared/contract/instruments';
import { InstrumentDue } from '../../ui/marks/instrument-due';
import { BenchSettings } from '../bench-settings';

type Chosen = Partial<Record<InstrumentKind, number>>;

/** Names the instruments a rack measured with, one of each kind that the plan asks for. */
@Component({
  selector: 'qr-rack-instruments',
  imports: [InstrumentDue, MatFormFieldModule, MatSelectModule],
  template: `
    @for (field of fields(); track field.kind) {
      <mat-form-field>
        <mat-label>{{ field.title }}</mat-label>
        <mat-select [value]="byKind()[field.kind]" placeholder="Choose" (valueChange)="choose(field.kind, $event)">
          @for (instrument of field.offered; track instrument.id) {
            <mat-option [value]="instrument.id" [disabled]="!instrument.usable">
              <b class="mono">{{ instrument.assetNumber }}</b> {{ instrument.description }}
              <qr-instrument-due [due]="instrument.calibrationDue" />
            </mat-option>
          } @empty {
            <mat-option disabled>None in service</mat-option>
          }
        </mat-select>
      </mat-form-field>
    } @empty {
      <p class="quiet">The plan asks for none.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackInstruments {
  private readonly settings = inject(BenchSettings);

  readonly bench = input.required<Bench>();
  /** Ids of the instruments named, whenever they change. */
  readonly chosen = output<readonly number[]>();

  private readonly picked = signal<Chosen>({});

  protected readonly fields = computed(() => {
    const { characteristics, instruments } = this.bench();
    const kinds = characteristics.map((each) => (each.kind === 'computed' ? null : each.instrumentKind));
    return [...new Set(kinds.filter((kind) => kind !== null))].map((kind) => ({
      kind,
      title: INSTRUMENT_KIND_TITLES[kind],
      offered: instruments.filter((each) => each.kind === kind && each.status === 'in-service'),
    }));
  });
  /** What is picked here, else what this bench used last, else the only one there is. */
  protected readonly byKind = computed(() => {
    const chosen: Chosen = {};
    for (const { kind, offered } of this.fields()) {
      const usable = offered.filter((each) => each.usable);
      const wanted = this.picked()[kind] ?? this.settings.instruments()[kind];
      chosen[kind] = usable.find(({ id }) => id === wanted)?.id ?? (usable.length === 1 ? usable[0]?.id : undefined);
    }
    return chosen;
  });

  constructor() {
    effect(() => {
      const ids = Object.values(this.byKind()).filter((id) => id !== undefined);
      untracked(() => this.chosen.emit(ids));
    });
  }

  protected choose(kind: InstrumentKind, id: number): void {
    this.picked.update((picked) => ({ ...picked, [kind]: id }));
  }
}
