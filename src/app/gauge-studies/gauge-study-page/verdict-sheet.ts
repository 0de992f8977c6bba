import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type GaugeStudy, type StudyResults } from '#shared/contract/gauge-studies';
import { criteriaOf, smallStudySentences, VERDICT_SOURCE, verdictTitle } from '#shared/papers/gauge-study-words';
import { leadingTable } from '#shared/statistics/gauge-study/leading-table';
import { type GaugeFitness, studyVerdict } from '#shared/statistics/gauge-study/study-verdict';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { type VerdictLook } from '../../ui/verdict-look';

const LOOKS: Readonly<Record<GaugeFitness, VerdictLook>> = {
  acceptable: 'ok',
  conditional: 'hold',
  'not-acceptable': 'nok',
};

/** What a study says of its gauge, in words: the verdict, each criterion, and what is rough about it. */
@Component({
  selector: 'qr-verdict-sheet',
  imports: [VerdictMark],
  template: `
    <p class="verdict" [class]="look()"><qr-verdict-mark [look]="look()" [size]="28" />{{ title() }}</p>
    <ul>
      @for (one of criteria(); track one.criterion) {
        <li><qr-verdict-mark [look]="one.look" [size]="16" />{{ one.sentence }}</li>
      }
      @for (sentence of small(); track sentence) {
        <li><qr-verdict-mark look="hold" [size]="16" />{{ sentence }}</li>
      }
    </ul>
    <p class="caption">{{ source }}</p>
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
      align-content: start;
    }
    .verdict {
      display: flex;
      gap: 12px;
      align-items: center;
      font: var(--qr-t-title-l);
    }
    ul {
      display: grid;
      gap: 8px;
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li {
      display: flex;
      gap: 10px;
      align-items: flex-start;
    }
    li qr-verdict-mark {
      flex: none;
      margin-top: 2px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VerdictSheet {
  readonly study = input.required<GaugeStudy>();
  readonly results = input.required<StudyResults>();

  protected readonly source = VERDICT_SOURCE;
  private readonly analysis = computed(() => leadingTable(this.results()).analysis);
  protected readonly title = computed(() => verdictTitle(this.results()));
  protected readonly look = computed(() => {
    const { overall } = studyVerdict(this.analysis());
    return overall === null ? 'open' : LOOKS[overall];
  });
  protected readonly criteria = computed(() =>
    criteriaOf(this.analysis()).map((one) => ({ ...one, look: LOOKS[one.fitness] })),
  );
  protected readonly small = computed(() => {
    const { parts, persons } = this.study();
    return smallStudySentences({ parts: parts.length, persons: persons.length });
  });
}
