import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Assessment } from '#shared/contract/decision';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { VerdictMark } from '../../ui/marks/verdict-mark';
import { Tally } from '../../ui/tally/tally';
import { CountPipe } from '../../ui/values/count-pipe';
import { type VerdictLook } from '../../ui/verdict-look';
import { tallyState } from './unit-look';

type Group = Assessment['groups'][number];

/** The sample unit by unit, why it is judged as it is, and what each class found against its numbers. */
@Component({
  selector: 'qr-sample-sheet',
  imports: [ClassGlyph, CountPipe, Tally, VerdictMark],
  templateUrl: './sample-sheet.html',
  styles: `
    :host {
      display: block;
    }
    .judged {
      display: flex;
      justify-content: space-between;
      align-items: baseline;
      margin-bottom: 8px;
    }
    .reason {
      margin: 6px 0 12px;
      font: var(--qr-t-small);
      color: var(--qr-ink-2);
    }
    td qr-verdict-mark {
      display: inline-flex;
    }
    .over {
      font-weight: 600;
      color: var(--qr-nok-text);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SampleSheet {
  readonly assessment = input.required<Assessment>();

  protected readonly states = computed(() => this.assessment().units.map(({ state }) => tallyState(state)));

  protected look({ found, group }: Group): VerdictLook {
    if (found >= group.rejection) return 'nok';
    return this.assessment().verdict === 'continue' ? 'open' : 'ok';
  }
}
