import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { type FormControl } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { map, startWith, switchMap } from 'rxjs';
import { type Role, ROLE_TITLES, ROLES } from '#shared/contract/roles';
import { ROLE_LINES } from '../role-words';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';

/** The roles a person holds, several at once, each with what it allows. */
@Component({
  selector: 'qr-roles-field',
  imports: [FieldErrorPipe, MatCheckbox],
  template: `
    <fieldset>
      <legend class="label">Roles</legend>
      @for (role of roles; track role.name) {
        <mat-checkbox [checked]="held().has(role.name)" (change)="hold(role.name, $event.checked)">
          <b>{{ role.title }}</b>
          <span class="quiet">{{ role.line }}</span>
        </mat-checkbox>
      }
      @if (faulty()) {
        <p class="small nok" role="alert">{{ control().errors | fieldError }}</p>
      }
    </fieldset>
  `,
  styles: `
    fieldset {
      display: grid;
      gap: 2px;
      margin: 0;
      padding: 0;
      border: 0;
    }
    legend {
      padding: 0 0 4px;
    }
    b {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RolesField {
  readonly control = input.required<FormControl<readonly Role[]>>();

  protected readonly roles = ROLES.map((name) => ({ name, title: ROLE_TITLES[name], line: ROLE_LINES[name] }));

  /** The control's state, told anew at each of its events. */
  private readonly state = toSignal(
    toObservable(this.control).pipe(
      switchMap((control) =>
        control.events.pipe(
          startWith(null),
          map(() => ({ value: control.value, faulty: control.invalid && control.touched })),
        ),
      ),
    ),
  );
  protected readonly held = computed(() => new Set(this.state()?.value));
  protected readonly faulty = computed(() => this.state()?.faulty ?? false);

  protected hold(role: Role, holds: boolean): void {
    const held = new Set(this.control().value);
    if (holds) held.add(role);
    else held.delete(role);
    this.control().setValue(ROLES.filter((each) => held.has(each)));
    this.control().markAsDirty();
  }
}
