/** A ref that gives an element the focus when it appears. */
export function takeFocus(element: HTMLElement | null): void {
  element?.focus();
}
