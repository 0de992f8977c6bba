import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MessageNote } from '../../ui/states/message-note';
import { BenchSheet } from '../sheet/bench-sheet';
import { ReadingQueue } from '../waiting/reading-queue';

/** What the server refused beside readings: taking a reading back, setting a unit aside. Readings say so in their cell. */
@Component({
  selector: 'qr-refused-acts',
  imports: [MessageNote],
  template: `
    @for (refused of acts(); track refused.id) {
      <qr-message-note look="nok">
        <b>{{ refused.what }}</b> {{ refused.refusal }}
        <button type="button" class="link" (click)="queue.discard(refused.id)">Understood</button>
      </qr-message-note>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    :host([hidden]) {
      display: none;
    }
    button {
      min-height: 24px;
      padding: 0;
      border: 0;
      background: none;
      font: inherit;
      font-weight: 500;
      cursor: pointer;
    }
  `,
  host: { '[hidden]': 'acts().length === 0' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RefusedActs {
  private readonly sheet = inject(BenchSheet);
  protected readonly queue = inject(ReadingQueue);

  protected readonly acts = computed(() => {
    const { id } = this.sheet.bench().lot;
    return this.queue.refused().flatMap(({ act, refusal }) => {
      if (act.lotId !== id || act.kind === 'reading') return [];
      const what =
        act.kind === 'withdrawal' ? 'the reading was not taken back.' : 'what was said of the unit was not kept.';
      return [{ id: act.id, what: `Unit ${act.unit}: ${what}`, refusal }];
    });
  });
}
