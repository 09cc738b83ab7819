/** The last stop of every failure: RFC 9457 problem details, and nothing of the inside. */
import type { ErrorRequestHandler, Response } from 'express';
import multer from 'multer';
import type { Problem } from '../contract/problems.ts';
import { ApplicationError, BadRequestError, StorageFullError, TooLargeError } from '../errors.ts';
import type { Logger } from '../log.ts';

/** Answers with problem details; unexpected failures are logged and answered with a plain 500. */
export function createProblemHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const known = error instanceof ApplicationError ? error : translate(error);
    if (known) {
      sendProblem(response, {
        type: 'about:blank',
        title: known.title,
        status: known.status,
        detail: known.message,
        ...known.extra,
      });
      return;
    }
    log.error({ err: error, path: request.path }, 'unexpected failure');
    sendProblem(response, {
      type: 'about:blank',
      title: 'Something went wrong here',
      status: 500,
      detail: 'This was our fault and it is on record. Nothing was changed; try again in a moment.',
    });
  };
}

export function sendProblem(response: Response, problem: Problem): void {
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
}

/** What the parser of uploads says of a request that is not one. */
const brokenForm =
  /^(Malformed (part header|content type)|Unexpected end of (form|file)|Multipart: |Missing Content-Type|Unsupported content type|Request (aborted|closed))/;

function translate(error: unknown): ApplicationError | null {
  if (error instanceof multer.MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') {
      return new TooLargeError(
        'One of the files is too large. Split it, or scan it again at 300 dpi.',
      );
    }
    return new BadRequestError(
      error.code === 'LIMIT_FILE_COUNT'
        ? 'Too many files at once. Send fewer at a time.'
        : 'The upload could not be read. Send the files in the field "files".',
    );
  }
  if (!(error instanceof Error)) return null;
  if ('code' in error && error.code === 'ENOSPC') {
    return new StorageFullError(
      'The disk of the server is full and nothing was stored. Ask whoever runs it to make room.',
    );
  }
  if (brokenForm.test(error.message)) {
    return new BadRequestError(
      'The upload broke off or is not well-formed. Send the files again, in the field "files".',
    );
  }
  if (!('status' in error)) return null;
  if (error.status === 400) return new BadRequestError('The request is not readable JSON.');
  if (error.status === 413) return new TooLargeError('The request is too large.');
  return null;
}
