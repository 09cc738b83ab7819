/**
 * A file or page that cannot be read. `message` is a sentence for the person who brought the file:
 * what is wrong and what to do next.
 */
export class UnreadableFileError extends Error {
  override name = 'UnreadableFileError';
}

/** The sentence of an `UnreadableFileError`, or a general one for anything unforeseen. */
export function describeReadingError(error: unknown): string {
  if (error instanceof UnreadableFileError) return error.message;
  return 'This file is damaged and could not be read. Scan or save it again.';
}
