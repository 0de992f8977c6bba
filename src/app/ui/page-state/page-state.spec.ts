import { ChangeDetectionStrategy, Component, type ResourceStatus, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { ApiProblem } from '../../data/api-problem';
import { Loaded } from './loaded';
import { PageState } from './page-state';
import { type ResourceLike } from './resource-like';

class Given implements ResourceLike<string | undefined> {
  readonly value = signal<string | undefined>(undefined);
  readonly status = signal<ResourceStatus>('loading');
  readonly error = signal<Error | undefined>(undefined);
  reloads = 0;

  hasValue(): boolean {
    return this.value() !== undefined;
  }

  reload(): boolean {
    this.reloads += 1;
    return true;
  }

  answer(text: string): void {
    this.error.set(undefined);
    this.value.set(text);
    this.status.set('resolved');
  }

  fail(status: number, title: string): void {
    this.value.set(undefined);
    this.error.set(new ApiProblem({ status, title, code: 'test' }, new Date(2026, 2, 12, 14, 31, 20)));
    this.status.set('error');
  }

  load(): void {
    this.value.set(undefined);
    this.error.set(undefined);
    this.status.set('loading');
  }
}

@Component({
  selector: 'qr-page-state-host',
  imports: [Loaded, PageState],
  template: `
    <qr-page-state what="The queue" whoMay="Queues are for receiving." [keepPrevious]="keep()">
      <ng-template [qrLoaded]="given" let-text>
        <p class="content">{{ text.toUpperCase() }}</p>
      </ng-template>
    </qr-page-state>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly given = new Given();
  readonly keep = signal(false);
}

describe('PageState', () => {
  let fixture: ComponentFixture<Host>;
  let given: Given;
  const element = () => fixture.nativeElement as HTMLElement;
  const text = () => element().textContent.replaceAll(/\s+/g, ' ');
  const content = () => element().querySelector('.content')?.textContent;

  beforeEach(async () => {
    fixture = TestBed.createComponent(Host);
    given = fixture.componentInstance.given;
    await fixture.whenStable();
  });

  it('says that it is loading', () => {
    expect(element().querySelector('[role=status]')?.textContent).toContain('The queue is loading.');
  });

  it('hands the value to the template', async () => {
    given.answer('ten lots');
    await fixture.whenStable();
    expect(content()).toBe('TEN LOTS');
  });

  it('says what failed, what the server said, and when, and tries again', async () => {
    given.fail(503, 'The database is busy.');
    await fixture.whenStable();
    expect(text()).toContain('The queue did not load.');
    expect(text()).toContain('The database is busy. The server answered 503 at 14:31:20.');
    [...element().querySelectorAll('button')].find((button) => button.textContent.includes('Try again'))?.click();
    expect(given.reloads).toBe(1);
  });

  it('explains who may see it to a person who may not', async () => {
    given.fail(403, 'Your roles do not allow this.');
    await fixture.whenStable();
    expect(text()).toContain('Queues are for receiving.');
    expect(text()).not.toContain('Try again');
  });

  it('says that a thing is not there', async () => {
    given.fail(404, 'Lot 7 does not exist.');
    await fixture.whenStable();
    expect(text()).toContain('Lot 7 does not exist.');
  });

  it('keeps what is shown while the server cannot be reached', async () => {
    given.answer('ten lots');
    await fixture.whenStable();
    given.fail(0, 'The server could not be reached.');
    await fixture.whenStable();
    expect(content()).toBe('TEN LOTS');
  });

  it('drops what is shown when another thing is loading, unless told to keep it', async () => {
    given.answer('ten lots');
    await fixture.whenStable();
    given.load();
    await fixture.whenStable();
    expect(content()).toBeUndefined();

    fixture.componentInstance.keep.set(true);
    given.answer('nine lots');
    await fixture.whenStable();
    given.load();
    await fixture.whenStable();
    expect(content()).toBe('NINE LOTS');
  });
});
