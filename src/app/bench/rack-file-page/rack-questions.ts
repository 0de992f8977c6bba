import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type RackPreview } from '#shared/contract/bench';
import { type Characteristic } from '#shared/contract/plans';
import { MessageNote } from '../../ui/states/message-note';
import { CountPipe } from '../../ui/values/count-pipe';
import { readingText } from '../../ui/values/reading-text';

/** Questions listed; with more of them the rack rather than the units is in doubt. */
const LISTED = 200;

/** Readings of a file that are far from what the part can give: they come in, and wait for a person's answer. */
@Component({
  selector: 'qr-rack-questions',
  imports: [CountPipe, MessageNote],
  template: `
    <h3>{{ questions().length | count }} {{ questions().length === 1 ? 'question' : 'questions' }}</h3>
    <qr-message-note look="hold">
      These readings are far from what the part can give. They come in; the lot cannot be submitted until somebody
      confirms or repeats each of them.
    </qr-message-note>
    <div class="scroll" tabindex="0" role="region" aria-label="Questions about the file">
      <table class="table">
        <thead>
          <tr>
            <th scope="col" class="right">Unit</th>
            <th scope="col">Characteristic</th>
            <th scope="col" class="right">Value</th>
            <th scope="col">Why it is asked</th>
          </tr>
        </thead>
        <tbody>
          @for (question of listed(); track $index) {
            <tr>
              <td class="num right">{{ question.unit | count }}</td>
              <td class="wrap">{{ question.name }}</td>
              <td class="num right">{{ question.value }}</td>
              <td class="why">{{ question.sentence }}</td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    @if (questions().length > listed().length) {
      <p class="caption">The first {{ listed().length }} are listed.</p>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
      min-width: 0;
    }
    .scroll {
      max-height: 300px;
      overflow: auto;
      border: 1px solid var(--qr-line);
      border-radius: var(--qr-r-control);
    }
    .why {
      min-width: 240px;
      white-space: normal;
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RackQuestions {
  readonly questions = input.required<RackPreview['questions']>();
  readonly characteristics = input.required<readonly Characteristic[]>();

  private readonly byKey = computed(() => new Map(this.characteristics().map((each) => [each.key, each])));
  protected readonly listed = computed(() =>
    this.questions()
      .slice(0, LISTED)
      .map(({ unit, characteristicKey, value, sentence }) => {
        const characteristic = this.byKey().get(characteristicKey);
        const isMeasured = characteristic?.kind === 'measured';
        return {
          unit,
          name: characteristic?.name ?? characteristicKey,
          value: isMeasured ? readingText(value, characteristic.unit, characteristic.decimals) : String(value),
          sentence,
        };
      }),
  );
}
