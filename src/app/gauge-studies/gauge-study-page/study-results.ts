import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type GaugeStudy, type StudyResults as Results } from '#shared/contract/gauge-studies';
import { poolingSentence } from '#shared/papers/gauge-study-words';
import { leadingTable } from '#shared/statistics/gauge-study/leading-table';
import { groupsByPart, groupsByPerson } from '#shared/statistics/gauge-study/study-groups';
import { type GroupsOfReadings } from './group-options';
import { GroupsChart } from './groups-chart';
import { SpreadShares } from './spread-shares';
import { VarianceSheet } from './variance-sheet';

/** The results of a whole study: both methods side by side, the charts, and the table they rest on. */
@Component({
  selector: 'qr-study-results',
  imports: [GroupsChart, SpreadShares, VarianceSheet],
  templateUrl: './study-results.html',
  styleUrl: './study-results.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StudyResults {
  readonly study = input.required<GaugeStudy>();
  readonly results = input.required<Results>();

  protected readonly leading = computed(() => leadingTable(this.results()));
  protected readonly pooling = computed(() => poolingSentence(this.results()));
  private readonly readings = computed(() =>
    this.study().values.map((rows) => rows.map((cell) => cell.filter((value) => value !== null))),
  );
  protected readonly byPart = computed((): GroupsOfReadings => {
    const { parts, unit, decimals } = this.study();
    return { names: parts, groups: groupsByPart(this.readings()), unit, decimals };
  });
  protected readonly byPerson = computed((): GroupsOfReadings => {
    const { persons, unit, decimals } = this.study();
    return { names: persons, groups: groupsByPerson(this.readings()), unit, decimals };
  });
}
