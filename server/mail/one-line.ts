/** Line ends, tabs and other control characters: in a plain-text letter they could pass for lines of ours. */
const BREAKS = /[\p{Cc}\u2028\u2029]+/gu;
/** Characters that turn the direction of the text after them around. */
const TURNS = /[\u202a-\u202e\u2066-\u2069]/gu;

/** Text somebody typed, made fit to stand within a line of a letter. */
export function oneLine(text: string): string {
  return text.replaceAll(BREAKS, ' ').replaceAll(TURNS, '').trim();
}

/** Text of several lines, each made fit; empty lines are left out. */
export function lines(text: string): string[] {
  return text
    .split(/\r\n|[\n\r\u2028\u2029]/)
    .map(oneLine)
    .filter((line) => line !== '');
}
