import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import { fieldProblemsOf } from './api-error.ts';

/**
 * Ties the faults that the server found to the fields of a form. Gives true when there were any, so that
 * the caller can leave its general message out.
 */
export function applyFieldProblems<T extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<T>,
): boolean {
  const problems = fieldProblemsOf(error);
  problems.forEach(({ field, message }, i) => {
    setError(field as Path<T>, { type: 'server', message }, { shouldFocus: i === 0 });
  });
  return problems.length > 0;
}
