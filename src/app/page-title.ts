import { inject, Injectable, signal } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';

const PRODUCT = 'Quietrail';

/** The title of the page that is shown: in the window's title with the product's name, alone on a narrow screen's top bar. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  private readonly window = inject(Title);
  private readonly shown = signal('');

  readonly name = this.shown.asReadonly();

  override updateTitle(snapshot: RouterStateSnapshot): void {
    this.show(this.buildTitle(snapshot) ?? '');
  }

  /** For a page whose title is known only when its record is: "L-26-0412". */
  show(name: string): void {
    this.shown.set(name);
    this.window.setTitle(name === '' ? PRODUCT : `${name} - ${PRODUCT}`);
  }
}
