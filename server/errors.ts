/** What the application says when something is refused. The HTTP status follows from the class. */
import type { FieldProblem, Problem } from './contract/problems.ts';

export type Reason = NonNullable<Problem['reasons']>[number];

/** Base of all refusals that a person can do something about. */
export abstract class ApplicationError extends Error {
  abstract readonly status: number;
  abstract readonly title: string;
  /** Merged into the problem details of the answer. */
  get extra(): Partial<Problem> {
    return {};
  }
}

/** Not there, or not for the caller to know of. */
export class NotFoundError extends ApplicationError {
  readonly status = 404;
  readonly title = 'Not found';
  constructor(message = 'There is nothing here under this address.') {
    super(message);
  }
}

export class SignInNeededError extends ApplicationError {
  readonly status = 401;
  readonly title = 'Sign in first';
  constructor(message = 'Sign in to go on.') {
    super(message);
  }
}

export class ForbiddenError extends ApplicationError {
  readonly status = 403;
  readonly title = 'Not allowed';
}

export class BadRequestError extends ApplicationError {
  readonly status = 400;
  readonly title = 'The request could not be read';
}

/** Input that does not fit; each field is named. */
export class InvalidInputError extends ApplicationError {
  readonly status = 422;
  readonly title = 'Some of this does not fit';
  readonly fields: FieldProblem[];
  constructor(fields: FieldProblem[]) {
    super(fields.map((f) => f.message).join(' ') || 'Check the marked fields.');
    this.fields = fields;
  }
  override get extra(): Partial<Problem> {
    return { fields: this.fields };
  }
}

/** The state of things does not allow it; the message says what to do instead. */
export class ConflictError extends ApplicationError {
  readonly status = 409;
  readonly title = 'That cannot be done now';
}

/** The gate keeps papers in; one sentence for each reason. */
export class GateClosedError extends ApplicationError {
  readonly status = 409;
  readonly title = 'This may not leave';
  readonly reasons: Reason[];
  constructor(reasons: Reason[]) {
    super(reasons.map((r) => r.sentence).join(' '));
    this.reasons = reasons;
  }
  override get extra(): Partial<Problem> {
    return { reasons: this.reasons };
  }
}

/** Somebody else changed the record meanwhile; `current` is how it stands now. */
export class StaleVersionError extends ApplicationError {
  readonly status = 412;
  readonly title = 'Changed meanwhile';
  readonly current: unknown;
  constructor(current: unknown) {
    super('Somebody changed this meanwhile. Look at both versions and decide again.');
    this.current = current;
  }
  override get extra(): Partial<Problem> {
    return { current: this.current };
  }
}

export class VersionNeededError extends ApplicationError {
  readonly status = 428;
  readonly title = 'The version is missing';
  constructor() {
    super("Send the version you saw in the If-Match header, so that nobody's change is lost.");
  }
}

export class TooManyError extends ApplicationError {
  readonly status = 429;
  readonly title = 'Too many attempts';
}

/** The disk of the server is full. */
export class StorageFullError extends ApplicationError {
  readonly status = 507;
  readonly title = 'No room left';
}

export class TooLargeError extends ApplicationError {
  readonly status = 413;
  readonly title = 'Too large';
}
