import { ChangeDetectionStrategy, Component } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule, Validators } from '@angular/forms';
import { formFieldDefaults } from '../material-defaults';
import { QuantityField } from './quantity-field';

@Component({
  selector: 'qr-quantity-field-host',
  imports: [QuantityField, ReactiveFormsModule],
  template: `<qr-quantity-field label="Upper limit" unit="mV p-p" [formControl]="control" />`,
  providers: [formFieldDefaults],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly control = new FormControl<number | null>(null, Validators.required);
}

async function setUp() {
  const fixture = TestBed.createComponent(Host);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const box = element.querySelector('input');
  if (box === null) throw new Error('There is no field.');
  return { fixture, element, box, control: fixture.componentInstance.control };
}

async function type({ fixture, box }: { fixture: ComponentFixture<Host>; box: HTMLInputElement }, text: string) {
  box.value = text;
  box.dispatchEvent(new Event('input'));
  box.dispatchEvent(new Event('blur'));
  await fixture.whenStable();
}

describe('QuantityField', () => {
  it('takes a bare number in the unit it shows', async () => {
    const field = await setUp();
    await type(field, '185');
    expect(field.control.value).toBe(0.185);
    expect(field.element.textContent).toContain('mV p-p');
  });

  it('takes a prefixed number as it is written', async () => {
    const field = await setUp();
    await type(field, '1.2 V');
    expect(field.control.value).toBe(1.2);
  });

  it('shows a value in its unit', async () => {
    const field = await setUp();
    field.control.setValue(0.035);
    await field.fixture.whenStable();
    expect(field.box.value).toBe('35');
  });

  it('says what it does not understand, and is invalid', async () => {
    const field = await setUp();
    await type(field, 'abc');
    expect(field.control.value).toBeNull();
    expect(field.control.errors).toHaveProperty('quantity');
    expect(field.element.querySelector('mat-error')?.textContent.trim()).not.toBe('');
  });

  it('refuses another unit', async () => {
    const field = await setUp();
    await type(field, '35 mA');
    expect(field.control.invalid).toBe(true);
  });

  it('shows what its form says against it', async () => {
    const field = await setUp();
    await type(field, '');
    expect(field.element.querySelector('mat-error')?.textContent).toContain('Fill this in.');
    field.control.setErrors({ refused: 'The upper limit is below the lower one.' });
    await field.fixture.whenStable();
    expect(field.element.querySelector('mat-error')?.textContent).toContain('below the lower one');
  });
});
