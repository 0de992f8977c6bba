/** What a key asks of the queue. */
export type QueueKey = 'receive' | 'start' | 'down' | 'up';

const KEYS: Readonly<Record<string, QueueKey>> = { r: 'receive', Enter: 'start', ArrowDown: 'down', ArrowUp: 'up' };

/** Which step a key is for; undefined when it belongs to a field, a control or a dialog instead of the queue. */
export function pageKey(event: KeyboardEvent): QueueKey | undefined {
  if (event.defaultPrevented || event.altKey || event.ctrlKey || event.metaKey) return undefined;
  const key = KEYS[event.key];
  const from = event.target;
  if (key === undefined || !(from instanceof HTMLElement)) return undefined;
  if (from.closest('input, textarea, select, [role="listbox"], [role="menu"], .cdk-overlay-container'))
    return undefined;
  const inQueue = from === document.body || from.closest('qr-queue-table, main') !== null;
  const onControl = from.closest('a, button') !== null && from.closest('qr-queue-table') === null;
  if (!inQueue || (key === 'start' && onControl)) return undefined;
  return key;
}
