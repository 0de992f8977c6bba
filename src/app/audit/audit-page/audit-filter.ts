import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelectModule } from '@angular/material/select';
import { SUBJECT_TITLES } from '../audit-words';

/** What the shown entries are about; both parts may be left open. */
export interface AuditQuery {
  readonly subject?: string;
  readonly subjectId?: string;
}

/** Narrows the trail to one kind of thing, or to one thing. */
@Component({
  selector: 'qr-audit-filter',
  imports: [MatButton, MatFormFieldModule, MatInput, MatSelectModule],
  template: `
    <mat-form-field>
      <mat-label>About</mat-label>
      <mat-select [value]="query().subject ?? ''" (selectionChange)="changed.emit({ subject: $event.value })">
        <mat-option value="">everything</mat-option>
        @for (subject of subjects; track subject.name) {
          <mat-option [value]="subject.name">{{ subject.title }}</mat-option>
        }
      </mat-select>
    </mat-form-field>
    <mat-form-field>
      <mat-label>Number</mat-label>
      <input
        #id
        matInput
        class="num"
        maxlength="60"
        placeholder="any"
        autocomplete="off"
        [value]="query().subjectId ?? ''"
        (change)="changed.emit({ subject: query().subject, subjectId: id.value.trim() })"
      />
    </mat-form-field>
    @if (narrowed()) {
      <button type="button" matButton (click)="changed.emit({})">Show all</button>
    }
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 200px) minmax(0, 200px) auto;
      gap: 12px;
      align-items: end;
      justify-content: start;
      padding: 8px 16px 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditFilter {
  readonly query = input.required<AuditQuery>();
  readonly changed = output<AuditQuery>();

  protected readonly subjects = Object.entries(SUBJECT_TITLES).map(([name, title]) => ({ name, title }));
  protected readonly narrowed = computed(() => Boolean(this.query().subject) || Boolean(this.query().subjectId));
}
