import type { PerAxis } from '../case';
import type { FieldError } from '../result';

/** An object whose fields have not been checked. */
export type Fields = Readonly<Record<string, unknown>>;

/** The names that an object may have. */
export type FieldNames = ReadonlySet<string>;

/** A range of numbers and the words for it. */
export interface NumberRange {
  readonly isInside: (value: number) => boolean;
  readonly allowed: string;
}

/** Any positive number. */
export const POSITIVE: NumberRange = {
  isInside: (value) => value > 0,
  allowed: 'a finite number above 0',
};

/**
 * Checks the fields of one object and collects what is wrong with them. A path is only put together
 * when there is something wrong.
 */
export class FieldCheck {
  constructor(
    readonly errors: FieldError[],
    private readonly parent?: FieldCheck,
    private readonly name: string | number = '',
  ) {}

  /** The check of an object or list inside this one. */
  within(name: string | number): FieldCheck {
    return new FieldCheck(this.errors, this, name);
  }

  /** Says that a field is wrong; '' stands for the object itself. */
  fail(name: string | number, message: string, allowed: string): void {
    this.errors.push({ path: this.pathOf(name), message, allowed });
  }

  /** This object, with no other fields than these. */
  object(value: unknown, names: FieldNames): Fields | undefined {
    if (typeof value !== 'object' || value === null || Array.isArray(value)) {
      const what = typeof this.name === 'number' ? 'Each of them' : this.name || 'A case';
      this.fail('', `${what} must be an object${given(value)}.`, fieldList(names));
      return undefined;
    }
    for (const key in value) {
      if (!names.has(key)) this.fail(key, `There is no field "${key}".`, fieldList(names));
    }
    return value as Fields;
  }

  text(value: unknown, name: string): void {
    if (typeof value !== 'string') {
      this.fail(name, `${name} must be a text${given(value)}.`, 'a text');
    }
  }

  /** One of several words. */
  choice(value: unknown, name: string, words: readonly string[]): boolean {
    if (typeof value === 'string' && words.includes(value)) return true;
    const what =
      value === undefined ? `${name} is missing` : `${name} must be one of these${given(value)}`;
    this.fail(name, `${what}.`, words.join(', '));
    return false;
  }

  /** A finite number in a range. */
  number(value: unknown, name: string | number, range: NumberRange = POSITIVE): value is number {
    if (typeof value === 'number' && Number.isFinite(value) && range.isInside(value)) return true;
    const what = value === undefined ? 'is missing' : `must be ${range.allowed}${given(value)}`;
    this.fail(name, `${typeof name === 'number' ? 'Each axis' : name} ${what}.`, range.allowed);
    return false;
  }

  /** One positive number for both axes, or two. */
  perAxis(value: unknown, name: string): value is PerAxis {
    if (!Array.isArray(value)) return this.number(value, name, ONE_OR_TWO);
    if (value.length !== 2) {
      this.fail(name, `${name} must have two numbers, not ${value.length}.`, '[x, y]');
      return false;
    }
    const axes = this.within(name);
    const isX = axes.number(value[0], 0);
    return axes.number(value[1], 1) && isX;
  }

  private pathOf(name: string | number): string {
    const own = this.parent?.pathOf(this.name) ?? '';
    if (typeof name === 'number') return `${own}[${name}]`;
    return own === '' || name === '' ? `${own}${name}` : `${own}.${name}`;
  }
}

const ONE_OR_TWO: NumberRange = {
  isInside: POSITIVE.isInside,
  allowed: `${POSITIVE.allowed}, or two as [x, y]`,
};

function fieldList(names: FieldNames): string {
  return `fields: ${[...names].join(', ')}`;
}

const LONGEST_QUOTE = 40;

/** What was given instead, as far as it can be said in a few words. */
function given(value: unknown): string {
  switch (typeof value) {
    case 'undefined':
      return '';
    case 'string':
      return `, not "${value.length > LONGEST_QUOTE ? `${value.slice(0, LONGEST_QUOTE)}…` : value}"`;
    case 'number':
    case 'boolean':
      return `, not ${value}`;
    case 'object':
      if (value === null) return ', not null';
      return Array.isArray(value) ? ', not a list' : ', not an object';
    default:
      return `, not a ${typeof value}`;
  }
}
