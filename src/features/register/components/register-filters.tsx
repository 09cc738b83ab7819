import { useEffect, useState } from 'react';
import { Columns3, Search, SlidersHorizontal, X } from 'lucide-react';
import { paperStatuses, pileLabels, piles } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Menu, MenuCheck } from '../../../components/ui/menu.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { formatDay } from '../../../lib/format.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import type { FilterName, Filters } from '../logic/filters.ts';
import { filterNames } from '../logic/filters.ts';
import type { ColumnVisibility } from '../logic/use-columns.ts';
import { statusWords } from '../logic/words.ts';
import { KindFilter } from './kind-filter.tsx';
import { columns, fixedColumns } from './register-columns.tsx';

/** Asked a moment after the last letter, not with each. */
const typingPauseMs = 300;

interface RegisterFiltersProps {
  filters: Filters;
  boxes: { id: string; code: string; label: string }[];
  onChange: (change: Partial<Filters>) => void;
  onClear: () => void;
}

/** Search and filters of the register; on a phone the filters wait behind a button. */
export function RegisterFilters({ filters, boxes, onChange, onClear }: RegisterFiltersProps) {
  const [isOpen, setIsOpen] = useState(false);
  const set = filterNames.filter((name) => name !== 'q' && filters[name] !== '').length;
  const choose = (name: FilterName, label: string, choices: [string, string][]) => (
    <Field label={label} className="w-full sm:w-40">
      {(props) => (
        <Select
          {...props}
          value={filters[name]}
          onChange={(event) => onChange({ [name]: event.target.value })}
        >
          <option value="">All</option>
          {choices.map(([value, words]) => (
            <option key={value} value={value}>
              {words}
            </option>
          ))}
        </Select>
      )}
    </Field>
  );
  return (
    <div role="search" className="mb-4 flex flex-wrap items-end gap-3">
      <SearchBox value={filters.q} onSearch={(q) => onChange({ q })} />
      <Button
        className="sm:hidden"
        icon={<SlidersHorizontal aria-hidden />}
        aria-expanded={isOpen}
        aria-controls="register-filters"
        onClick={() => setIsOpen(!isOpen)}
      >
        {set > 0 ? `Filters (${set} set)` : 'Filters'}
      </Button>
      <div
        id="register-filters"
        className={joinClasses(
          'w-full flex-wrap items-end gap-3 sm:flex sm:w-auto',
          isOpen ? 'flex' : 'hidden',
        )}
      >
        <KindFilter filters={filters} onChange={onChange} />
        {choose(
          'status',
          'State',
          paperStatuses.map((status) => [status, statusWords[status]]),
        )}
        {choose(
          'pile',
          'Pile',
          piles.map((pile) => [pile, pileLabels[pile]]),
        )}
        {boxes.length > 0
          ? choose(
              'box',
              'Box',
              boxes.map((box) => [box.id, `${box.code} ${box.label}`.trim()]),
            )
          : null}
        {choose('held', 'Don’t destroy yet', [
          ['true', 'set'],
          ['false', 'not set'],
        ])}
      </div>
      {filters.dueBy ? (
        <Button icon={<X aria-hidden />} onClick={() => onChange({ dueBy: '' })}>
          May go by {formatDay(filters.dueBy)}
          <span className="sr-only">: show papers of any date</span>
        </Button>
      ) : null}
      {set > 0 || filters.q ? (
        <Button tone="plain" onClick={onClear}>
          Show all
        </Button>
      ) : null}
    </div>
  );
}

function SearchBox({ value, onSearch }: { value: string; onSearch: (q: string) => void }) {
  const [text, setText] = useState(value);
  const [lastValue, setLastValue] = useState(value);
  // The address changed by other means, for example the back button.
  if (value !== lastValue) {
    setLastValue(value);
    setText(value);
  }
  useEffect(() => {
    if (text === value) return;
    const timer = setTimeout(() => onSearch(text), typingPauseMs);
    return () => clearTimeout(timer);
  }, [text, value, onSearch]);
  return (
    <Field label="Any word on the paper" className="w-full sm:w-72">
      {(props) => (
        <span className="relative">
          <Search
            aria-hidden
            className="pointer-events-none absolute top-1/2 left-3 size-5 -translate-y-1/2 text-ink-faint"
          />
          <TextInput
            {...props}
            type="search"
            className="w-full pl-10"
            value={text}
            onChange={(event) => setText(event.target.value)}
          />
        </span>
      )}
    </Field>
  );
}

/** Which columns are in view. */
export function ColumnMenu({
  visibility,
  onShow,
}: {
  visibility: ColumnVisibility;
  onShow: (id: string, isShown: boolean) => void;
}) {
  return (
    <Menu trigger={<Button icon={<Columns3 aria-hidden />}>Columns</Button>}>
      {columns
        .filter((column) => !fixedColumns.has(column.id ?? ''))
        .map((column) => (
          <MenuCheck
            key={column.id}
            checked={visibility[column.id ?? ''] !== false}
            onCheckedChange={(isShown) => onShow(column.id ?? '', isShown)}
          >
            {String(column.header)}
          </MenuCheck>
        ))}
    </Menu>
  );
}
