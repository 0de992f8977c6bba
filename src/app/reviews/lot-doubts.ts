import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listLotDoubts, type LotDoubt } from '#shared/contract/calibrations';
import { endpointResource } from '../data/api';
import { may } from '../session/may';
import { MessageNote } from '../ui/states/message-note';

const WORDS: Readonly<Record<'none' | 'measure-again' | 'recall', string>> = {
  none: 'clears this lot',
  'measure-again': 'asks that this lot be measured again',
  recall: 'asks that this lot be recalled',
};

function wordsOf({ assetNumber, effect, note }: LotDoubt) {
  const said = effect === null ? 'has not said yet what that means for this lot' : WORDS[effect];
  const end = note === '' ? '.' : `: ${note}`;
  return { found: `Readings with ${assetNumber}, found out of tolerance, count here.`, said: said + end };
}

/** What reviews of instruments leave open about a lot; nothing where no reading in doubt counts. */
@Component({
  selector: 'qr-lot-doubts',
  imports: [MessageNote, RouterLink],
  template: `
    @for (doubt of shown(); track doubt.reviewId) {
      <qr-message-note [look]="doubt.effect === 'recall' ? 'nok' : 'hold'">
        {{ doubt.found }}
        <a class="link" [routerLink]="['/reviews', doubt.reviewId]">Review {{ doubt.number }}</a> {{ doubt.said }}
      </qr-message-note>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      overflow-wrap: anywhere;
    }
    :host:empty {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LotDoubts {
  readonly lotId = input.required<number>();

  private readonly mayRead = may(listLotDoubts);
  private readonly doubts = endpointResource(listLotDoubts, () =>
    this.mayRead() ? { params: { id: this.lotId() } } : undefined,
  );
  protected readonly shown = computed(() => {
    const items = this.doubts.hasValue() ? this.doubts.value().items : [];
    return items.map((doubt) => ({ ...doubt, ...wordsOf(doubt) }));
  });
}
