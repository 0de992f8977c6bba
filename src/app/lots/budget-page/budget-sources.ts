import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { type Budget, type BudgetReading } from '#shared/contract/budgets';
import { AS_FOUND_TITLES } from '#shared/contract/calibrations';
import { INSTRUMENT_KIND_TITLES, listInstruments } from '#shared/contract/instruments';
import { accuracyText, resolutionText } from '#shared/uncertainty/accuracy-text';
import { may } from '../../session/may';
import { entryWords } from '../../ui/values/entry-words';
import { MomentPipe } from '../../ui/values/moment-pipe';
import { readingText } from '../../ui/values/reading-text';
import { uncertaintyText } from '../../ui/values/uncertainty-text';
import { inputTitle } from './budget-words';

/** The readings that a budget rests on: how each was taken, on which range, and the calibration that held then. */
@Component({
  selector: 'qr-budget-sources',
  imports: [MomentPipe, RouterLink],
  template: `
    @for (reading of readings(); track reading.id) {
      <section class="sheet pad">
        <h2>
          {{ reading.title }}
          <span class="num">{{ reading.value }}</span>
        </h2>
        <dl class="kv">
          @if (reading.typed) {
            <dt>As entered</dt>
            <dd>{{ reading.typed }}</dd>
          }
          <dt>Taken</dt>
          <dd>{{ reading.takenAt | moment: 'full' }}, {{ reading.by }}</dd>
          @if (reading.kept) {
            <dt>U kept with it</dt>
            <dd class="num">{{ reading.kept }}</dd>
          }
          @if (reading.instrument; as instrument) {
            <dt>Instrument</dt>
            <dd>
              @if (mayOpen()) {
                <a class="link" [routerLink]="['/instruments', instrument.id]">{{ instrument.assetNumber }}</a>
              } @else {
                {{ instrument.assetNumber }}
              }
              {{ kinds[instrument.kind] }}, {{ instrument.description }}
            </dd>
            @if (instrument.range; as range) {
              <dt>Range</dt>
              <dd>{{ range.name }}, {{ resolution(range) }}</dd>
              <dt>Accuracy</dt>
              <dd>{{ accuracy(range) }}</dd>
            }
            <dt>Calibration then</dt>
            @if (instrument.calibration; as calibration) {
              <dd>
                {{ calibration.certificateNumber }} of {{ calibration.calibratedOn }}, {{ calibration.laboratory }}, due
                {{ calibration.dueOn }}; as found: {{ asFound[calibration.asFound].toLowerCase() }}
              </dd>
            } @else {
              <dd class="quiet">none recorded before this reading</dd>
            }
          } @else {
            <dt>Instrument</dt>
            <dd class="quiet">none named</dd>
          }
        </dl>
      </section>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: repeat(auto-fit, minmax(min(380px, 100%), 1fr));
      gap: 12px;
    }
    h2 {
      display: flex;
      flex-wrap: wrap;
      gap: 4px 12px;
      justify-content: space-between;
      margin-bottom: 8px;
    }
    dd {
      overflow-wrap: anywhere;
    }
    section {
      break-inside: avoid;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BudgetSources {
  readonly budget = input.required<Budget>();

  protected readonly mayOpen = may(listInstruments);
  protected readonly kinds = INSTRUMENT_KIND_TITLES;
  protected readonly asFound = AS_FOUND_TITLES;
  protected readonly accuracy = accuracyText;
  protected readonly resolution = resolutionText;
  protected readonly readings = computed(() => this.budget().readings.map((reading) => this.shown(reading)));

  private shown(reading: BudgetReading) {
    const { characteristic, value, expandedUncertainty, takenBy, rack, attempt, withdrawn } = reading;
    const unit = characteristic.kind === 'attribute' ? '' : characteristic.unit;
    const decimals = characteristic.kind === 'attribute' ? 0 : characteristic.decimals;
    const told = [takenBy ?? rack ?? 'a rack', attempt > 1 ? `attempt ${attempt}` : '', withdrawn ? 'taken back' : ''];
    return {
      ...reading,
      title: inputTitle(this.budget(), reading.input) || 'Reading',
      value: readingText(value, unit, decimals),
      typed: entryWords(reading.entry),
      kept: expandedUncertainty === null ? '' : uncertaintyText(expandedUncertainty, unit),
      by: told.filter((part) => part !== '').join(', '),
    };
  }
}
