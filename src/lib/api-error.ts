import type { FieldProblem, Problem } from '../../server/contract/problems.ts';

/** The server answered, and said no. `problem` is the RFC 9457 body. */
export class ApiError extends Error {
  readonly status: number;
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail || problem.title);
    this.name = 'ApiError';
    this.status = problem.status;
    this.problem = problem;
  }
}

/** The server could not be reached, or the connection broke. */
export class NetworkError extends Error {
  constructor() {
    super('The connection is gone. Check it and try again; what you entered is still here.');
    this.name = 'NetworkError';
  }
}

/** Whether somebody else changed the record in the meantime (412). */
export function isConflict(error: unknown): error is ApiError {
  return error instanceof ApiError && error.status === 412;
}

/** The fields the server found fault with; empty for any other error. */
export function fieldProblemsOf(error: unknown): FieldProblem[] {
  return error instanceof ApiError ? (error.problem.fields ?? []) : [];
}

/** A sentence for the screen, whatever was thrown. */
export function sentenceOf(error: unknown): string {
  if (error instanceof ApiError || error instanceof NetworkError) return error.message;
  return 'Something went wrong on this screen. Load the page again; nothing you saved is lost.';
}
