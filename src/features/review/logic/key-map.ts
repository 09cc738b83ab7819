import { pileLabels, piles, type Pile } from '../../../../server/contract/papers.ts';

/** Everything that the desk does on a single key. */
export type ReviewCommand =
  | { does: 'accept' }
  | { does: 'pile'; pile: Pile }
  | {
      does:
        | 'change-kind'
        | 'correct-facts'
        | 'why-kept'
        | 'place'
        | 'note'
        | 'hold'
        | 'step-down'
        | 'join'
        | 'cut'
        | 'undo'
        | 'skip'
        | 'back'
        | 'next-page'
        | 'previous-page'
        | 'zoom-in'
        | 'zoom-out'
        | 'turn'
        | 'fit'
        | 'marks'
        | 'help';
    };

export interface KeyBinding {
  key: string;
  /** Other keys that do the same without being shown. */
  also?: string[];
  /** The key as printed on the screen. */
  shown: string;
  says: string;
  command: ReviewCommand;
}

export interface KeyGroup {
  title: string;
  bindings: KeyBinding[];
}

/** Keys in the groups in which the help shows them. */
export const keyGroups: KeyGroup[] = [
  {
    title: 'Decide',
    bindings: [
      { key: 'enter', shown: 'Enter', says: 'Keep it, as suggested', command: { does: 'accept' } },
      ...piles.map((pile, index) => ({
        key: String(index + 1),
        shown: String(index + 1),
        says: pileLabels[pile],
        command: { does: 'pile' as const, pile },
      })),
      { key: 'z', shown: 'Z', says: 'Take the last step back', command: { does: 'undo' } },
      { key: 's', shown: 'S', says: 'Next paper, decide later', command: { does: 'skip' } },
      { key: 'b', shown: 'B', says: 'Back to the paper before', command: { does: 'back' } },
    ],
  },
  {
    title: 'Correct and add',
    bindings: [
      { key: 'k', shown: 'K', says: 'Change the kind of paper', command: { does: 'change-kind' } },
      {
        key: 'd',
        shown: 'D',
        says: 'Correct dates, issuer, reference, tax year',
        command: { does: 'correct-facts' },
      },
      { key: 'y', shown: 'Y', says: 'Say why it is kept', command: { does: 'why-kept' } },
      { key: 'p', shown: 'P', says: 'Say where it is kept', command: { does: 'place' } },
      { key: 'n', shown: 'N', says: 'Write a note', command: { does: 'note' } },
      { key: 'h', shown: 'H', says: 'Don’t destroy yet', command: { does: 'hold' } },
      { key: 't', shown: 'T', says: 'Take the shorter time', command: { does: 'step-down' } },
      { key: 'j', shown: 'J', says: 'Join with a neighbour', command: { does: 'join' } },
      { key: 'c', shown: 'C', says: 'Cut apart before this page', command: { does: 'cut' } },
    ],
  },
  {
    title: 'Look',
    bindings: [
      {
        key: 'arrowright',
        also: ['pagedown'],
        shown: '→',
        says: 'Next page',
        command: { does: 'next-page' },
      },
      {
        key: 'arrowleft',
        also: ['pageup'],
        shown: '←',
        says: 'Page before',
        command: { does: 'previous-page' },
      },
      { key: '+', also: ['='], shown: '+', says: 'Larger', command: { does: 'zoom-in' } },
      { key: '-', also: ['_'], shown: '−', says: 'Smaller', command: { does: 'zoom-out' } },
      { key: 'r', shown: 'R', says: 'Turn the page', command: { does: 'turn' } },
      { key: 'f', shown: 'F', says: 'Whole page or full width', command: { does: 'fit' } },
      { key: 'm', shown: 'M', says: 'Marks on or off', command: { does: 'marks' } },
      { key: '?', shown: '?', says: 'This list of keys', command: { does: 'help' } },
    ],
  },
];

const byKey = new Map<string, ReviewCommand>(
  keyGroups
    .flatMap((group) => group.bindings)
    .flatMap((binding) =>
      [binding.key, ...(binding.also ?? [])].map((key) => [key, binding.command] as const),
    ),
);

export interface KeyPress {
  key: string;
  code?: string;
  ctrlKey?: boolean;
  metaKey?: boolean;
  altKey?: boolean;
  shiftKey?: boolean;
}

/** The command of a key press; null when the key means nothing here or belongs to the browser. */
export function findCommand(press: KeyPress): ReviewCommand | null {
  if (press.ctrlKey || press.metaKey || press.altKey) return null;
  const found = byKey.get(press.key.toLowerCase());
  if (found) return found;
  // On keyboards whose digit row needs Shift for digits (French), the key's place counts.
  const digit = /^(?:Digit|Numpad)([1-8])$/.exec(press.code ?? '')?.[1];
  return digit && !press.shiftKey ? (byKey.get(digit) ?? null) : null;
}

/** The printed key of a command, for the hint on its button. */
export function findShownKey(command: ReviewCommand): string | null {
  const match = keyGroups
    .flatMap((group) => group.bindings)
    .find(({ command: other }) =>
      command.does === 'pile'
        ? other.does === 'pile' && other.pile === command.pile
        : other.does === command.does,
    );
  return match?.shown ?? null;
}

const typingSelector =
  'input:not([type=checkbox]):not([type=radio]):not([type=button]), textarea, select, [contenteditable=true], [role=textbox], [role=combobox]';
const pressableSelector =
  'button, a[href], summary, input, [role=button], [role=menuitem], [role=tab], [role=option], [role=radio]';

/** Whether a key press belongs to the element that has the focus rather than to the desk. */
export function belongsToFocus(target: EventTarget | null, key: string): boolean {
  if (!(target instanceof Element)) return false;
  if (target.closest('[role=dialog], [role=alertdialog], [role=menu], [role=listbox]')) return true;
  if (target.closest(typingSelector)) return true;
  if (target.matches('input[type=radio]') && key.startsWith('Arrow')) return true;
  return (key === 'Enter' || key === ' ') && target.closest(pressableSelector) !== null;
}
