import { useEffect, useId, useRef, useState } from 'react';
import type { KeyboardEvent } from 'react';
import { Search } from 'lucide-react';
import { classGroupLabels, classLabel } from '../../../server/contract/document-classes.ts';
import type { ClassId } from '../../../server/contract/document-classes.ts';
import { findClasses } from '../../lib/find-classes.ts';
import { joinClasses } from '../../lib/join-classes.ts';
import { controlStyle } from './control-style.ts';
import type { ControlProps } from './field.tsx';

interface ClassPickerProps extends Partial<ControlProps> {
  value: ClassId | null;
  onChange: (value: ClassId) => void;
  /** Kinds to show first, for example the reader's other guesses. */
  suggested?: readonly ClassId[];
  /** Shows the list at once instead of when it is entered; for use inside a dialog. */
  alwaysOpen?: boolean;
  /** Takes focus when it appears. */
  takeFocus?: boolean;
  onCancel?: () => void;
}

/** Chooses a kind of paper by typing any word of it; arrows and Enter, or a thumb. */
export function ClassPicker({
  value,
  onChange,
  suggested = [],
  alwaysOpen = false,
  takeFocus = false,
  onCancel,
  id,
  ...described
}: ClassPickerProps) {
  const ownId = useId();
  const inputId = id ?? ownId;
  const listId = `${inputId}-list`;
  const [words, setWords] = useState<string | null>(null);
  const [opened, setOpened] = useState(false);
  const [at, setAt] = useState(0);
  const input = useRef<HTMLInputElement>(null);
  const list = useRef<HTMLUListElement>(null);
  const open = alwaysOpen || opened;
  const found = open ? findClasses(words ?? '', suggested) : [];
  const active = found[Math.min(at, found.length - 1)];

  useEffect(() => {
    if (takeFocus) input.current?.focus();
  }, [takeFocus]);
  useEffect(() => {
    list.current?.querySelector('[aria-selected="true"]')?.scrollIntoView({ block: 'nearest' });
  }, [at]);

  const choose = (chosen: ClassId): void => {
    setWords(null);
    setOpened(false);
    onChange(chosen);
  };
  const handleKey = (event: KeyboardEvent): void => {
    const moves: Record<string, number> = { ArrowDown: 1, ArrowUp: -1 };
    const move = moves[event.key];
    if (move !== undefined) {
      event.preventDefault();
      setOpened(true);
      if (open) setAt((Math.min(at, found.length - 1) + move + found.length) % found.length || 0);
    } else if (event.key === 'Enter' && open) {
      event.preventDefault();
      if (active) choose(active.id as ClassId);
    } else if (event.key === 'Escape' && open) {
      if (!alwaysOpen) event.preventDefault();
      setOpened(false);
      setWords(null);
      onCancel?.();
    }
  };

  return (
    <div className="relative">
      <Search
        aria-hidden
        className="pointer-events-none absolute top-3 left-3 size-5 text-ink-faint"
      />
      <input
        {...described}
        ref={input}
        id={inputId}
        type="text"
        role="combobox"
        aria-label={id ? undefined : 'Kind of paper'}
        aria-autocomplete="list"
        aria-expanded={open}
        aria-controls={listId}
        aria-activedescendant={open && active ? `${listId}-${active.id}` : undefined}
        autoComplete="off"
        placeholder="Type a word, for example water or bank"
        className={joinClasses(controlStyle, 'pl-10')}
        value={words ?? (value ? classLabel(value) : '')}
        onFocus={(event) => {
          setOpened(true);
          setAt(0);
          event.target.select();
        }}
        onBlur={() => {
          setOpened(false);
          setWords(null);
        }}
        onChange={(event) => {
          setWords(event.target.value);
          setOpened(true);
          setAt(0);
        }}
        onKeyDown={handleKey}
      />
      <ul
        ref={list}
        id={listId}
        role="listbox"
        aria-label="Kinds of paper"
        hidden={!open}
        className={joinClasses(
          'overflow-y-auto rounded-md border border-line-strong bg-paper-raised p-1',
          alwaysOpen ? 'mt-2 h-[min(24rem,45dvh)]' : 'absolute z-30 mt-1 max-h-80 w-full shadow-lg',
        )}
      >
        {found.map((c) => (
          // The keyboard stays in the box above, which points at the option it is on.
          // eslint would have the option focusable; a listbox run by its input is not.
          <li
            key={c.id}
            id={`${listId}-${c.id}`}
            role="option"
            aria-selected={c.id === active?.id}
            tabIndex={-1}
            onPointerDown={(event) => event.preventDefault()}
            onClick={() => choose(c.id as ClassId)}
            onKeyDown={handleKey}
            className={joinClasses(
              'cursor-pointer rounded px-3 py-2',
              c.id === active?.id ? 'bg-teal-wash' : 'hover:bg-paper-sunk',
            )}
          >
            <span className="flex items-baseline justify-between gap-3">
              <span className="font-semibold">{c.label}</span>
              <span className="text-sm text-ink-soft">{classGroupLabels[c.group]}</span>
            </span>
            <span className="block text-sm text-ink-soft">{c.covers}</span>
          </li>
        ))}
        {open && found.length === 0 ? (
          <li role="presentation" className="px-3 py-3 text-ink-soft">
            No kind of paper has these words. Try another word, or choose “Not recognised yet”.
          </li>
        ) : null}
      </ul>
    </div>
  );
}
