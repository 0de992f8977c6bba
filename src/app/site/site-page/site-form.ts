import { ChangeDetectionStrategy, Component, effect, inject, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSnackBar } from '@angular/material/snack-bar';
import { changeSite, readSite, type Site, siteBody } from '#shared/contract/site';
import { ApiClient } from '../../data/api';
import { RecordForm } from '../../data/record-form';
import { ConflictNote } from '../../ui/conflict-note';
import { FormFoot } from '../../ui/form-foot';
import { QuantityField } from '../../ui/quantity-field/quantity-field';
import { FieldErrorPipe } from '../../ui/values/field-error-pipe';
import { SiteFields } from './site-fields';

/** Changes the settings of the site. */
@Component({
  selector: 'qr-site-form',
  imports: [
    ConflictNote,
    FieldErrorPipe,
    FormFoot,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    QuantityField,
    ReactiveFormsModule,
  ],
  templateUrl: './site-form.html',
  styles: `
    .waivers {
      display: grid;
      gap: 2px;
    }
    h2 {
      margin-top: 6px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SiteForm {
  private readonly api = inject(ApiClient);
  private readonly snackBar = inject(MatSnackBar);

  readonly site = input.required<Site>();
  readonly saved = output<Site>();

  protected readonly form = new RecordForm(new SiteFields(), () => this.api.call(readSite, {}));
  protected readonly controls = this.form.fields.group.controls;

  constructor() {
    effect(() => this.form.take(this.site()));
  }

  hasUnsaved(): boolean {
    return this.form.hasUnsaved();
  }

  protected save(): void {
    this.form.submit(
      siteBody,
      this.form.fields.value(),
      (body, version) => this.api.call(changeSite, { body, version }),
      (saved) => {
        this.saved.emit(saved);
        this.snackBar.open('Site settings saved');
      },
    );
  }
}
