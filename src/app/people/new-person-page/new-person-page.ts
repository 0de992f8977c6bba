import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { addPerson, personBody } from '#shared/contract/people';
import { ApiClient, type Reply } from '../../data/api';
import { RecordSave } from '../../data/record-save';
import { BackLink } from '../../shell/back-link';
import { type HoldsTyping } from '../../shell/leave-guard';
import { FormFoot } from '../../ui/form-foot';
import { OneTimeLink } from '../one-time-link';
import { PersonFields } from '../person-form/person-fields';
import { PersonForm } from '../person-form/person-form';

/** Makes an account and shows the link with which its owner sets a password. */
@Component({
  selector: 'qr-new-person-page',
  imports: [BackLink, FormFoot, MatButton, OneTimeLink, PersonForm, ReactiveFormsModule, RouterLink],
  templateUrl: './new-person-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewPersonPage implements HoldsTyping {
  private readonly api = inject(ApiClient);

  protected readonly fields = new PersonFields();
  protected readonly saving = new RecordSave();
  protected readonly added = signal<Reply<typeof addPerson> | null>(null);

  hasUnsaved(): boolean {
    return this.added() === null && this.fields.group.dirty;
  }

  protected save(): void {
    this.saving.submit(this.fields.group, {
      schema: personBody,
      value: this.fields.value(),
      call: (body) => this.api.call(addPerson, { body }),
      saved: (added) => this.added.set(added),
    });
  }

  protected startAnew(): void {
    this.fields.group.reset();
    this.added.set(null);
  }
}
