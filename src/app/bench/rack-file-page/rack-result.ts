import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type RackPreview } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { VerdictChip } from '../../ui/marks/verdict-chip';
import { CountPipe } from '../../ui/values/count-pipe';

/** Units named one by one before the rest is only counted. */
const NAMED = 12;
const WORDS = { continue: 'Continue', accepted: 'Accepted', rejected: 'Rejected' } as const;
const LOOKS = { continue: 'open', accepted: 'ok', rejected: 'nok' } as const;

/** What a rack file would bring: its readings, and the verdict they lead to. */
@Component({
  selector: 'qr-rack-result',
  imports: [CountPipe, VerdictChip],
  templateUrl: './rack-result.html',
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
    dd {
      overflow-wrap: anywhere;
    }
    qr-verdict-chip {
      margin-right: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackResult {
  readonly preview = input.required<RackPreview>();
  readonly characteristics = input.required<readonly Characteristic[]>();

  private readonly names = computed(() => new Map(this.characteristics().map(({ key, name }) => [key, name])));

  protected readonly look = computed(() => LOOKS[this.preview().verdict]);
  protected readonly word = computed(() => WORDS[this.preview().verdict]);
  protected readonly units = computed(() => {
    const { nonconformingUnits } = this.preview();
    const named = nonconformingUnits.slice(0, NAMED).map(({ unit, failed }) => {
      const what = failed.map((key) => this.names().get(key) ?? key).join(', ');
      return `${unit} (${what})`;
    });
    const more = nonconformingUnits.length - named.length;
    return [...named, ...(more > 0 ? [`and ${more} more`] : [])].join('; ') || 'none';
  });
  protected readonly groups = computed(() =>
    this.preview()
      .groups.map((each) => `${each.class} ${each.found} (Ac ${each.acceptance}, Re ${each.rejection})`)
      .join('; '),
  );
}
