import type * as z from 'zod';

/** Our words for what a schema refuses without words of its own; given to every parse. */
export function contractWords(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined
        ? 'Fill this in.'
        : 'This is not of the kind asked for here.';
    case 'too_small':
      return issue.origin === 'array' ? 'Give at least one.' : `At least ${issue.minimum}.`;
    case 'too_big':
      return issue.origin === 'string'
        ? `At most ${issue.maximum} characters.`
        : `At most ${issue.maximum}.`;
    case 'invalid_value':
      return 'Choose one of the list.';
    case 'invalid_format':
      return 'This does not have the form that is needed here.';
    default:
      return undefined;
  }
}
