import type { FieldError } from '@shared/model/problem';
import type * as z from 'zod';

type RawIssue = z.core.$ZodRawIssue;

/** Our words where a schema has none of its own; given to every parse. */
export function wordsFor(issue: RawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      return typeWords(issue);
    case 'too_small':
    case 'too_big':
      return `This is out of range: ${rangeWords(issue)}.`;
    case 'invalid_value':
      return `This must be ${listWords(issue.values)}.`;
    case 'unrecognized_keys':
      return `Not known here: ${issue.keys.join(', ')}.`;
    case 'invalid_union':
      return 'This has none of the forms that are allowed here.';
    case 'invalid_format':
      return FORMAT_WORDS[issue.format] ?? 'This does not have the form that is needed.';
    default:
      return undefined;
  }
}

/** The issues of a failed parse as errors at fields, with what is allowed where it can be said. */
export function fieldErrors(error: z.ZodError, prefix: readonly PropertyKey[] = []): FieldError[] {
  return error.issues.flatMap((issue) => errorsOf(issue, prefix));
}

/** `emissions[0].wavelengthNm.value`, as the form names its controls. */
export function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, part) => {
    if (typeof part === 'number') return `${text}[${part}]`;
    return text === '' ? String(part) : `${text}.${String(part)}`;
  }, '');
}

function errorsOf(issue: z.core.$ZodIssue, prefix: readonly PropertyKey[]): FieldError[] {
  const path = [...prefix, ...issue.path];
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: pathText([...path, key]),
      message: `${key} is not known here. Leave it out, or check its spelling.`,
    }));
  }
  if (issue.code === 'invalid_union') {
    // The form that got furthest says best what is wrong.
    const [nearest] = [...issue.errors].sort((a, b) => depthOf(b) - depthOf(a));
    if (nearest && depthOf(nearest) > 0) return nearest.flatMap((it) => errorsOf(it, path));
  }
  const allowed = allowedBy(issue);
  return [{ path: pathText(path), message: issue.message, ...(allowed ? { allowed } : {}) }];
}

function depthOf(issues: readonly z.core.$ZodIssue[]): number {
  return Math.max(0, ...issues.map((issue) => issue.path.length));
}

function typeWords(issue: RawIssue & { code: 'invalid_type' }): string {
  if (issue.input === undefined) return 'This is missing.';
  if (Array.isArray(issue.input) && issue.expected !== 'array') {
    return 'This is given more than once; give it once.';
  }
  return `This must be ${TYPE_WORDS[issue.expected] ?? issue.expected}.`;
}

const TYPE_WORDS: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  object: 'an object with named fields',
  record: 'an object with named fields',
  array: 'a list',
  null: 'null',
};

const FORMAT_WORDS: Readonly<Record<string, string>> = {
  datetime: 'Give a UTC instant to the millisecond, for example 2026-12-01T09:30:00.000Z.',
  date: 'Give a date with its year, for example 2026-12-01.',
  email: 'Enter an e-mail address.',
};

/** What is allowed, where the rule itself says so. */
function allowedBy(issue: z.core.$ZodIssue): string | undefined {
  switch (issue.code) {
    case 'too_small':
    case 'too_big':
      // "At least one character" says no more than that something is missing.
      return COUNTED[issue.origin] && issue.code === 'too_small' && issue.minimum === 1
        ? undefined
        : rangeWords(issue);
    case 'invalid_value':
      return listWords(issue.values);
    case 'not_multiple_of':
      return `multiples of ${issue.divisor}`;
    case 'invalid_format':
      return FORMAT_WORDS[issue.format];
    default:
      return undefined;
  }
}

const COUNTED: Readonly<Record<string, string>> = {
  string: 'characters',
  array: 'entries',
  set: 'entries',
  map: 'entries',
};

function rangeWords(
  issue:
    | Pick<z.core.$ZodIssueTooSmall, 'code' | 'minimum' | 'inclusive' | 'origin'>
    | Pick<z.core.$ZodIssueTooBig, 'code' | 'maximum' | 'inclusive' | 'origin'>,
): string {
  const unit = COUNTED[issue.origin];
  const inclusive = issue.inclusive ?? true;
  const words =
    issue.code === 'too_small'
      ? `${inclusive ? 'at least' : 'more than'} ${issue.minimum}`
      : `${inclusive ? 'at most' : 'less than'} ${issue.maximum}`;
  return unit ? `${words} ${unit}` : words;
}

function listWords(values: readonly unknown[]): string {
  const words = values.map(String);
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} or ${words.at(-1)}`;
}
