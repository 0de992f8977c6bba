import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatSelectModule } from '@angular/material/select';
import { type RackPreview } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { ScrollRegion } from '../../ui/scroll-region';
import { holdsWords, type Meaning, typedOf, UNIT } from './column-meaning';

/** What a person says of a column. */
export interface SaidOfColumn {
  readonly header: string;
  readonly meaning: Meaning;
}

/** The select's value for a column that is skipped; keys have no capital letters. */
const SKIP = 'SKIP';

/** The columns of a rack file with their first values, and what each of them holds. */
@Component({
  selector: 'qr-rack-columns',
  imports: [MatFormFieldModule, MatSelectModule, ScrollRegion],
  templateUrl: './rack-columns.html',
  styleUrl: './rack-columns.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackColumns {
  readonly columns = input.required<RackPreview['columns']>();
  readonly meanings = input.required<ReadonlyMap<string, Meaning>>();
  readonly characteristics = input.required<readonly Characteristic[]>();
  readonly faults = input.required<RackPreview['faults']>();
  readonly said = output<SaidOfColumn>();

  protected readonly skip = SKIP;
  protected readonly unit = UNIT;
  protected readonly offered = computed(() =>
    typedOf(this.characteristics()).map((each) => ({ key: each.key, holds: holdsWords(each) })),
  );
  protected readonly lines = computed(() => {
    const [meanings, faults] = [this.meanings(), this.faults()];
    return this.columns().map(({ header, samples }) => ({
      header,
      samples: samples.filter((sample) => sample !== '').join(', ') || 'empty',
      chosen: meanings.has(header) ? (meanings.get(header) ?? SKIP) : null,
      fault: faultOf(header, meanings, faults),
    }));
  });
  /** How many columns nobody has said anything of. */
  protected readonly open = computed(() => this.lines().filter(({ chosen }) => chosen === null).length);

  protected choose(header: string, chosen: string): void {
    this.said.emit({ header, meaning: chosen === SKIP ? null : chosen });
  }
}

/** What stands beside a column: the first thing that is wrong in it, and how many more there are. */
function faultOf(
  header: string,
  meanings: ReadonlyMap<string, Meaning>,
  faults: RackPreview['faults'],
): string | undefined {
  if (!meanings.has(header)) return 'Say what this column holds, or skip it.';
  const own = faults.filter(({ column }) => column === header);
  const [first] = own;
  if (first === undefined) return undefined;
  const more = own.length > 1 ? ` And ${own.length - 1} more.` : '';
  return `Line ${first.line}: ${first.message}${more}`;
}
