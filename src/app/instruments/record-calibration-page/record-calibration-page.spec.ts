import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { openPage, problem } from '../../../testing/open-page';
import { calibrationReply, instrumentReply } from '../testing/instrument-reply';
import { aYearLater, type CalibrationFields } from './calibration-fields';
import { RecordCalibrationPage } from './record-calibration-page';

async function openForm() {
  const page = await openPage(RecordCalibrationPage, ['quality'], { id: 3 });
  await page.answer('/api/instruments/3', instrumentReply());
  await page.answer('/api/instruments/3/history', { calibrations: [calibrationReply()], checks: [], reviews: [] });
  const { fields } = page.fixture.componentInstance as unknown as {
    fields: CalibrationFields;
  };
  return { page, fields };
}

describe('RecordCalibrationPage', () => {
  it('begins with the laboratory and the points of the calibration before, and what they showed left open', async () => {
    const { fields, page } = await openForm();
    expect(fields.group.getRawValue()).toMatchObject({
      laboratory: 'Weir Lane Calibration',
      certificateNumber: '',
      asFound: null,
      points: [
        { point: 'DC 10 V', unit: 'V', reference: 10, found: null, limit: 0.0019 },
        { point: 'DC 19 V', unit: 'V', reference: 19, found: null, limit: 0.0036 },
      ],
    });
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
  });

  it('says beside the field what is missing', async () => {
    const { page } = await openForm();
    await page.press('Record calibration');
    const errors = [...page.element.querySelectorAll('mat-error')].map((error) => error.textContent?.trim());
    expect(errors).toContain('Fill this in.');
    expect(errors).toContain('Choose one of those offered.');
    expect(errors.filter((error) => error === 'A number is needed.')).toHaveLength(2);
    page.http.expectNone('/api/instruments/3/calibrations');
  });

  it('shows how far off a point is, records, and goes to the review that opens', async () => {
    const { page, fields } = await openForm();
    const go = vi.spyOn(TestBed.inject(Router), 'navigate').mockResolvedValue(true);
    await page.type('Certificate number', 'WL-1290');
    fields.group.controls.asFound.setValue('out-of-tolerance');
    fields.points.controls.forEach(({ controls }, index) => controls.found.setValue(index === 0 ? 10.001 : 18.99));
    await page.fixture.whenStable();
    expect(page.text()).toContain('DM-11 is withdrawn, and a review opens');
    expect(page.text()).toContain('−10 mV , beyond what is allowed');
    await page.press('Record calibration');
    const request = page.http.expectOne('/api/instruments/3/calibrations');
    expect(request.request.headers.get('If-Match')).toBe('"4"');
    expect(request.request.body).toMatchObject({ certificateNumber: 'WL-1290', adjusted: false });
    const reply = { instrument: instrumentReply({ status: 'withdrawn' }), calibrationId: 22, reviewId: 6 };
    request.flush(reply, { status: 201, statusText: 'Created' });
    await page.fixture.whenStable();
    expect(go).toHaveBeenCalledWith(['/reviews', 6], { replaceUrl: true });
    expect(page.fixture.componentInstance.hasUnsaved()).toBe(false);
  });

  it('keeps what was typed where the instrument was changed meanwhile', async () => {
    const { page, fields } = await openForm();
    await page.type('Certificate number', 'WL-1290');
    fields.group.controls.asFound.setValue('in-tolerance');
    fields.points.controls.forEach(({ controls }) => controls.found.setValue(controls.reference.value));
    await page.press('Record calibration');
    await page.answer('/api/instruments/3/calibrations', problem(412, 'The instrument was changed.'), 412);
    await page.answer('/api/instruments/3', instrumentReply({ version: 5 }));
    expect(page.text()).toContain('What you typed stays; record it again.');
    expect(fields.group.controls.certificateNumber.value).toBe('WL-1290');
  });
});

describe('a year later', () => {
  it('is the same day, or the last of February', () => {
    expect(aYearLater('2026-12-01')).toBe('2027-12-01');
    expect(aYearLater('2028-02-29')).toBe('2029-02-28');
  });
});
