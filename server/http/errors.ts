import { type FieldError, type ProblemName, PROBLEMS } from '@shared/model/problem';

interface Extras {
  readonly errors?: readonly FieldError[];
  readonly reasons?: readonly string[];
  readonly currentVersion?: number;
  readonly headers?: Readonly<Record<string, string>>;
}

/** A refusal that the API answers as problem details; anything else thrown is a failure of ours. */
export class ApiError extends Error {
  constructor(
    readonly problem: ProblemName,
    detail: string,
    readonly extras: Extras = {},
  ) {
    super(detail);
    this.name = problem;
  }

  get status(): number {
    return PROBLEMS[this.problem].status;
  }
}

export class InvalidInput extends ApiError {
  constructor(errors: readonly FieldError[], detail?: string) {
    super('invalid-input', detail ?? summaryOf(errors), { errors });
  }
}

export class NotSignedIn extends ApiError {
  constructor(detail = 'You are not signed in, or your session has ended.') {
    super('not-signed-in', detail);
  }
}

/** The password given at a signature is wrong or missing. */
export class ProofFailed extends ApiError {
  constructor(detail = 'The password is not right. Nothing was signed.') {
    super('proof-failed', detail);
  }
}

export class NotAllowed extends ApiError {
  constructor(detail = 'Your roles do not include this step.') {
    super('not-allowed', detail);
  }
}

export class CrossSite extends ApiError {
  constructor(detail: string) {
    super('cross-site', detail);
  }
}

/** Also for what exists but lies outside the scope of the person. */
export class NotFound extends ApiError {
  constructor(what = 'page') {
    super('not-found', `There is no such ${what}, or it is not open to you.`);
  }
}

export class MethodNotAllowed extends ApiError {
  constructor(method: string, allowed: readonly string[]) {
    super('method-not-allowed', `${method} is not taken here. Allowed: ${allowed.join(', ')}.`, {
      headers: { Allow: allowed.join(', ') },
    });
  }
}

export class Conflict extends ApiError {
  constructor(detail: string, errors?: readonly FieldError[]) {
    super('conflict', detail, errors ? { errors } : {});
  }
}

export class GuardFailed extends ApiError {
  constructor(reasons: readonly string[]) {
    super('guard-failed', reasons.join(' '), { reasons });
  }
}

export class Gone extends ApiError {
  constructor(detail: string) {
    super('gone', detail);
  }
}

export class StaleVersion extends ApiError {
  constructor(currentVersion: number) {
    super('stale-version', `The stored version is ${currentVersion}. Read it and change that.`, {
      currentVersion,
    });
  }
}

export class VersionMissing extends ApiError {
  constructor() {
    super('version-missing', 'Send the version you read as If-Match, for example If-Match: "3".');
  }
}

export class TooLarge extends ApiError {
  constructor(detail: string) {
    super('too-large', detail);
  }
}

export class UnsupportedMedia extends ApiError {
  constructor(detail: string) {
    super('unsupported-media', detail);
  }
}

export class TooMany extends ApiError {
  constructor(detail: string, retryAfterS: number) {
    super('too-many', detail, { headers: { 'Retry-After': String(Math.ceil(retryAfterS)) } });
  }
}

export class Unavailable extends ApiError {
  constructor(detail: string) {
    super('unavailable', detail);
  }
}

function summaryOf(errors: readonly FieldError[]): string {
  const [first] = errors;
  if (errors.length === 1 && first) return first.message;
  return `${errors.length} fields need correction.`;
}
