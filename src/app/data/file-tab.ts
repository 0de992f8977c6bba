import { type Observable } from 'rxjs';
import { problemOf } from './api-problem';

/**
 * Follows a link to a file in a tab of its own. A link alone cannot renew a session that has run out meanwhile; a call does,
 * and so one is made before. The tab is opened at once, because browsers refuse one that comes later than the click.
 *
 * @param first a call whose refusal says why the file cannot be had
 */
export function openInTab(
  event: MouseEvent,
  address: string,
  first: Observable<unknown>,
  refused: (sentence: string) => void,
): void {
  if (event.ctrlKey || event.metaKey || event.shiftKey) return;
  const tab = window.open('', '_blank');
  if (tab === null) return;
  event.preventDefault();
  refused('');
  first.subscribe({
    next: () => tab.location.replace(address),
    error: (thrown: unknown) => {
      tab.close();
      refused(problemOf(thrown).message);
    },
  });
}
