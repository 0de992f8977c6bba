import * as z from 'zod';

/** What the usual limits of a field say when a value breaks them; a schema's own sentence goes before these. */
z.config({
  customError: (issue) => {
    switch (issue.code) {
      case 'too_big':
        return `At most ${String(issue.maximum)}${counted(issue.origin)}.`;
      case 'too_small':
        return `At least ${String(issue.minimum)}${counted(issue.origin)}.`;
      case 'invalid_type':
        return issue.expected === 'number' || issue.expected === 'int' ? 'A number is needed.' : 'Fill this in.';
      case 'invalid_value':
      case 'invalid_union':
        return 'Choose one of those offered.';
      case 'invalid_key':
        return 'A name in this list does not fit.';
      case 'invalid_format':
        return FORMATS[issue.format];
      default:
        return undefined;
    }
  },
});

const FORMATS: Readonly<Record<string, string>> = {
  date: 'Give a day, as 2026-03-12.',
  datetime: 'Give a day and a time.',
  email: 'This is not an e-mail address.',
};

/** What a length counts. */
function counted(origin: string): string {
  if (origin === 'string') return ' characters';
  return origin === 'array' ? ' entries' : '';
}
