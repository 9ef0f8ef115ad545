import type { PerAxis } from '../case';
import type { FieldError } from '../result';

/** An object whose fields have not been checked. */
export type Fields = Readonly<Record<string, unknown>>;

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

/** Checks fields and collects what is wrong with them. */
export class FieldCheck {
  readonly errors: FieldError[] = [];

  fail(path: string, message: string, allowed: string): void {
    this.errors.push({ path, message, allowed });
  }

  /** An object with no other fields than these; `refused` ones get an error of their own later. */
  object(
    value: unknown,
    path: string,
    known: readonly string[],
    refused: readonly string[] = [],
  ): Fields | undefined {
    if (typeof value !== 'object' || value === null || Array.isArray(value)) {
      this.fail(
        path,
        `${nameOf(path)} must be an object${given(value)}.`,
        `fields: ${known.join(', ')}`,
      );
      return undefined;
    }
    for (const key in value) {
      if (!known.includes(key) && !refused.includes(key)) {
        const field = path === '' ? key : `${path}.${key}`;
        this.fail(field, `There is no field "${key}".`, `fields: ${known.join(', ')}`);
      }
    }
    return value as Fields;
  }

  text(value: unknown, path: string): void {
    if (typeof value !== 'string')
      this.fail(path, `${nameOf(path)} must be a text${given(value)}.`, 'a text');
  }

  /** One of several words. */
  choice(
    value: unknown,
    path: string,
    words: readonly string[],
    message = 'This is not a choice',
  ): boolean {
    if (typeof value === 'string' && words.includes(value)) return true;
    const what = value === undefined ? `${nameOf(path)} is missing` : `${message}${given(value)}`;
    this.fail(path, `${what}.`, words.join(', '));
    return false;
  }

  /** A finite number in a range. */
  number(value: unknown, path: string, range: NumberRange = POSITIVE): value is number {
    if (typeof value === 'number' && Number.isFinite(value) && range.isInside(value)) return true;
    const what = value === undefined ? 'is missing' : `must be ${range.allowed}${given(value)}`;
    this.fail(path, `${nameOf(path)} ${what}.`, range.allowed);
    return false;
  }

  /** One positive number for both axes, or two. */
  perAxis(value: unknown, path: string): value is PerAxis {
    if (!Array.isArray(value)) {
      return this.number(value, path, {
        isInside: POSITIVE.isInside,
        allowed: `${POSITIVE.allowed}, or two as [x, y]`,
      });
    }
    if (value.length !== 2) {
      this.fail(path, `${nameOf(path)} must have two numbers, not ${value.length}.`, '[x, y]');
      return false;
    }
    const isX = this.number(value[0], `${path}[0]`);
    return this.number(value[1], `${path}[1]`) && isX;
  }
}

function nameOf(path: string): string {
  return path === '' ? 'A case' : path.slice(path.lastIndexOf('.') + 1);
}

function given(value: unknown): string {
  switch (typeof value) {
    case 'undefined':
      return '';
    case 'string':
      return `, not "${value.length > 40 ? `${value.slice(0, 40)}…` : value}"`;
    case 'number':
    case 'boolean':
      return `, not ${value}`;
    case 'object':
      return value === null
        ? ', not null'
        : Array.isArray(value)
          ? ', not a list'
          : ', not an object';
    default:
      return `, not a ${typeof value}`;
  }
}
