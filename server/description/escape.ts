const ESCAPES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

/** Text as it stands in HTML, between tags or in a quoted attribute. */
export function escape(text: string): string {
  return text.replaceAll(/[&<>"']/g, (letter) => ESCAPES[letter] ?? letter);
}
