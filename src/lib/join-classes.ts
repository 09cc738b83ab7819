/** Joins class names, leaving out what is false, null or undefined. */
export function joinClasses(...names: (string | false | null | undefined)[]): string {
  return names.filter(Boolean).join(' ');
}
