import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type LotSampling } from '#shared/contract/lots';
import { SCHEME_NAME, SCHEME_TABLES } from '#shared/sampling/scheme';
import { ClassGlyph } from '../../ui/marks/class-glyph';
import { SeverityMark } from '../../ui/marks/severity-mark';
import { CountPipe } from '../../ui/values/count-pipe';

/** How a lot is sampled, or would be by now: plan, level and letter, severity, sample, and n, Ac, Re of each group. */
@Component({
  selector: 'qr-sampling-facts',
  imports: [ClassGlyph, CountPipe, SeverityMark],
  templateUrl: './sampling-facts.html',
  styles: `
    .mini {
      margin-top: 10px;
    }
    .caption {
      margin-top: 8px;
    }
    .kv .num {
      font-weight: 500;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SamplingFacts {
  readonly sampling = input.required<LotSampling>();

  protected readonly scheme = `${SCHEME_NAME} (${SCHEME_TABLES}), single sampling`;

  /** Code letter of the groups at the plan's own level. */
  protected readonly letter = computed(() => {
    const { groups, level } = this.sampling();
    return (groups.find((group) => group.level === level) ?? groups[0])?.codeLetter ?? '';
  });
  protected readonly wholeLot = computed(() => this.sampling().groups.some((group) => group.wholeLot));
}
