import { inject } from '@angular/core';
import { type CanDeactivateFn } from '@angular/router';
import { Confirm } from '../ui/confirm/confirm';

/** A page on which typing could be lost. */
export interface HoldsTyping {
  hasUnsaved(): boolean;
}

/** Asks before a page with unsaved typing is left. */
export const leaveGuard: CanDeactivateFn<HoldsTyping> = (page) =>
  !page.hasUnsaved() ||
  inject(Confirm).ask({
    title: 'Leave without saving?',
    text: ['What you typed on this page is not saved and would be lost.'],
    confirm: 'Leave',
    cancel: 'Stay',
  });
