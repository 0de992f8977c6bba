import { ChangeDetectionStrategy, Component } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { Chart } from './chart';
import { chartAxis, chartBase } from './chart-base';
import { chartColours, type ChartColours } from './chart-colours';
import { ChartTable } from './chart-table';

@Component({
  selector: 'qr-chart-host',
  imports: [Chart, ChartTable],
  template: `
    <qr-chart label="Readings by part, 11.84 to 12.28 V." [options]="options">
      <ng-template qrChartTable><table class="same"></table></ng-template>
    </qr-chart>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  protected readonly options = (colours: ChartColours) => ({ ...chartBase(colours), xAxis: chartAxis(colours) });
}

describe('Chart', () => {
  let fixture: ComponentFixture<Host>;
  const element = () => fixture.nativeElement as HTMLElement;
  const plot = () => element().querySelector<HTMLElement>('[role=img]');

  beforeEach(async () => {
    fixture = TestBed.createComponent(Host);
    await fixture.whenStable();
  });

  it('says in a sentence what it shows', () => {
    expect(plot()?.getAttribute('aria-label')).toBe('Readings by part, 11.84 to 12.28 V.');
  });

  it('gives its table in place of the drawing, and the drawing back', async () => {
    const button = element().querySelector('button');
    button?.click();
    await fixture.whenStable();
    expect(plot()?.hidden).toBe(true);
    expect(element().querySelector('.same')).not.toBeNull();
    expect(button?.textContent.trim()).toBe('Show as chart');
    button?.click();
    await fixture.whenStable();
    expect(plot()?.hidden).toBe(false);
    expect(element().querySelector('.same')).toBeNull();
  });

  it('reads its colours without leaving anything behind', () => {
    const before = element().innerHTML;
    expect(Object.keys(chartColours(element()))).toContain('chart1');
    expect(element().innerHTML).toBe(before);
  });

  it('does not move when it is drawn', () => {
    expect(chartBase(chartColours(element()))['animation']).toBe(false);
  });
});
