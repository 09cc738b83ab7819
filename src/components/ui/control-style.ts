/** The classes of something typed into or chosen from. */
export const controlStyle =
  'min-h-11 w-full min-w-0 rounded-md border border-line-strong bg-paper-raised px-3 py-2 text-base ' +
  'text-ink placeholder:text-ink-faint disabled:bg-paper-sunk disabled:text-ink-faint ' +
  'aria-invalid:border-amber-strong aria-invalid:border-2';
