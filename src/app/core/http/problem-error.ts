import { PROBLEMS, type FieldError, type Problem, type ProblemName } from '@shared/model/problem';

/** What every failed request throws: the server's problem details, or one of our own making. */
export class ProblemError extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail ?? problem.title);
    this.name = 'ProblemError';
  }

  get errors(): readonly FieldError[] {
    return this.problem.errors ?? [];
  }

  get reasons(): readonly string[] {
    return this.problem.reasons ?? [];
  }

  is(name: ProblemName): boolean {
    return this.problem.name === name;
  }
}

export function problemError(name: ProblemName, detail: string): ProblemError {
  const { status, title } = PROBLEMS[name];
  return new ProblemError({ type: `/problems/${name}`, name, status, title, detail });
}

/** The problem inside anything thrown; what is not a problem is a failure of our own code. */
export function asProblem(error: unknown): Problem {
  if (error instanceof ProblemError) return error.problem;
  return problemError('internal', 'This page failed. What you typed is still here; try again.')
    .problem;
}
