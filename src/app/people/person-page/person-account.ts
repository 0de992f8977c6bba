import { ChangeDetectionStrategy, Component, effect, inject, input, output, signal } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { map } from 'rxjs';
import { changePerson, listPeople, type Person, personBody, resetPerson } from '#shared/contract/people';
import { ApiClient, type Reply } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { Confirm } from '../../ui/confirm/confirm';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { OneTimeLink } from '../one-time-link';
import { PersonFields } from '../person-form/person-fields';
import { PersonForm } from '../person-form/person-form';

/** What an administrator may do with an account: change it, deactivate it, give it a new password. */
@Component({
  selector: 'qr-person-account',
  imports: [ConflictNote, FormFoot, MatButton, OneTimeLink, PersonForm, ReactiveFormsModule],
  templateUrl: './person-account.html',
  host: { class: 'stack' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonAccount {
  private readonly api = inject(ApiClient);
  private readonly confirm = inject(Confirm);
  private readonly snackBar = inject(MatSnackBar);

  readonly person = input.required<Person>();
  readonly changed = output<Person>();

  protected readonly form = new RecordForm(new PersonFields(), () => this.readAgain());
  protected readonly link = signal<Reply<typeof resetPerson> | null>(null);

  constructor() {
    effect(() => this.form.take(this.person()));
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected save(active = this.person().active): void {
    const { id } = this.person();
    this.form.submit(
      personBody,
      this.form.fields.value(),
      (body, version) => this.api.call(changePerson, { params: { id }, body: { ...body, active }, version }),
      (saved) => {
        this.changed.emit(saved);
        this.snackBar.open(`${saved.name} saved`);
      },
    );
  }

  protected setActive(active: boolean): void {
    const { name } = this.person();
    const typed = this.hasUnsaved() ? ['What you typed on this page is saved with it.'] : [];
    const step = active
      ? { title: `Activate ${name}?`, text: ['The account can sign in again.', ...typed], confirm: 'Activate' }
      : {
          title: `Deactivate ${name}?`,
          text: ['All sessions of this account end at once, and it cannot sign in. Its records stay.', ...typed],
          confirm: 'Deactivate',
          destructive: true,
        };
    this.confirm.ask(step).subscribe((yes) => {
      if (yes) this.save(active);
    });
  }

  protected reset(): void {
    const { id, name } = this.person();
    const text = ['All sessions of this account end at once. You get a one-time link for a new password to hand over.'];
    this.confirm.ask({ title: `New password for ${name}?`, text, confirm: 'Make the link' }).subscribe((yes) => {
      if (!yes) return;
      this.form.saving.run(this.api.call(resetPerson, { params: { id } }), (made) => {
        this.link.set(made);
        this.changed.emit(made.person);
      });
    });
  }

  private readAgain() {
    const { id } = this.person();
    return this.api
      .call(listPeople, {})
      .pipe(map(({ items }) => items.find((person) => person.id === id) ?? this.person()));
  }
}
