import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type Fault } from '#shared/contract/problem';
import { MessageNote } from '../../ui/states/message-note';
import { type PlanDraft } from './plan-draft';

/** More faults than these are counted rather than listed. */
const MOST_LISTED = 5;

/** What has to be mended before a draft can be saved or approved; each line opens the characteristic it is about. */
@Component({
  selector: 'qr-fault-list',
  imports: [MessageNote],
  template: `
    @for (group of groups(); track group.sentence) {
      <qr-message-note look="hold">
        <p>{{ group.sentence }}</p>
        <ul>
          @for (fault of group.listed; track $index) {
            <li>
              @if (fault.index !== null) {
                <button type="button" class="link" (click)="open(fault.index)">{{ fault.place }}</button>
              } @else {
                {{ fault.place }}
              }
              {{ fault.message }}
            </li>
          }
        </ul>
      </qr-message-note>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: 8px;
    }
    ul {
      margin: 4px 0 0;
      padding-left: 16px;
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
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FaultList {
  readonly draft = input.required<PlanDraft>();

  protected readonly groups = computed(() =>
    [
      { faults: this.draft().faults(), until: 'the draft can be saved' },
      { faults: this.draft().guardFaults(), until: 'the plan can be approved' },
    ]
      .filter(({ faults }) => faults.length > 0)
      .map(({ faults, until }) => ({
        sentence: `${faults.length === 1 ? 'One thing is' : `${faults.length} things are`} to be mended before ${until}.`,
        listed: faults.slice(0, MOST_LISTED).map((fault) => ({ ...this.placeOf(fault), message: fault.message })),
      })),
  );

  protected open(index: number): void {
    const row = this.draft().rows()[index];
    if (row !== undefined) this.draft().selectedId.set(row.id);
  }

  private placeOf({ path: [area, at] }: Fault): { index: number | null; place: string } {
    if (area !== 'characteristics' || typeof at !== 'number') {
      const places: Record<string, string> = {
        classAqls: 'AQLs:',
        level: 'Level:',
        coverageFactor: 'Coverage factor:',
        warmUpMinutes: 'Warm-up:',
        changeNote: 'Why it changes:',
      };
      return { index: null, place: places[String(area)] ?? '' };
    }
    const name = this.draft().rows()[at]?.value.name;
    return { index: at, place: `${at + 1} ${name === undefined || name === '' ? 'Without a name' : name}:` };
  }
}
