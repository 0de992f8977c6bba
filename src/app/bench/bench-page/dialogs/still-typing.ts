/** No key for so long, in ms, ends what was being typed when a question came up. */
const PAUSE = 400;
/** Keys that nobody types a reading with. */
const DELIBERATE = /^(Escape|Tab|F\d+|Arrow\w+)$/;

/**
 * Tells keys meant for the reading from keys meant for a question that came up meanwhile. Somebody who types without looking
 * goes on typing after the question; those keys choose nothing. Only a pause shows that the question was seen.
 */
export class StillTyping {
  private lastKey = performance.now();
  private seen = false;

  /** Whether a key is still meant for what was typed before. */
  isMeant({ key }: KeyboardEvent): boolean {
    const now = performance.now();
    const paused = now - this.lastKey >= PAUSE;
    this.lastKey = now;
    this.seen ||= paused || DELIBERATE.test(key);
    return !this.seen;
  }
}
