import { useEffect, useEffectEvent } from 'react';
import { belongsToFocus, findCommand, type ReviewCommand } from '../logic/key-map.ts';

/** Runs a command for each key that means one, unless the person is typing or a dialog is open. */
export function useReviewKeys(isOn: boolean, run: (command: ReviewCommand) => void): void {
  const handle = useEffectEvent((event: KeyboardEvent) => {
    if (event.defaultPrevented || event.repeat) return;
    if (document.querySelector('[role=dialog], [role=alertdialog], [role=menu]')) return;
    if (belongsToFocus(event.target, event.key)) return;
    const command = findCommand(event);
    if (!command) return;
    event.preventDefault();
    run(command);
  });
  useEffect(() => {
    if (!isOn) return;
    const listener = (event: KeyboardEvent) => handle(event);
    window.addEventListener('keydown', listener);
    return () => window.removeEventListener('keydown', listener);
  }, [isOn]);
}
