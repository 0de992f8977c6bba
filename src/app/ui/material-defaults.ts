import { Dialog } from '@angular/cdk/dialog';
import { type Provider } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { MAT_FORM_FIELD_DEFAULT_OPTIONS, type MatFormFieldDefaultOptions } from '@angular/material/form-field';
import { MAT_SNACK_BAR_DEFAULT_OPTIONS, MatSnackBar } from '@angular/material/snack-bar';

const FORM_FIELD: MatFormFieldDefaultOptions = {
  appearance: 'outline',
  floatLabel: 'always',
  subscriptSizing: 'dynamic',
};

/** How Material's fields look here: outlined, the label above. */
export const formFieldDefaults: Provider = { provide: MAT_FORM_FIELD_DEFAULT_OPTIONS, useValue: FORM_FIELD };

/**
 * Material's defaults for everything behind sign-in. They are provided with the routes rather than at the root, so that the
 * first page does not have to load what it does not use; the services that open things are provided again beside them,
 * because what they open takes its defaults from where they are.
 */
export const materialDefaults: Provider[] = [
  formFieldDefaults,
  { provide: MAT_SNACK_BAR_DEFAULT_OPTIONS, useValue: { duration: 8000 } },
  Dialog,
  MatDialog,
  MatSnackBar,
];
