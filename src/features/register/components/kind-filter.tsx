import {
  classGroupLabels,
  classGroups,
  documentClasses,
} from '../../../../server/contract/document-classes.ts';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import type { Filters } from '../logic/filters.ts';

const wholeGroup = 'group:';

/** Papers of one kind, or of a whole group of kinds. */
export function KindFilter({
  filters,
  onChange,
}: {
  filters: Filters;
  onChange: (change: Partial<Filters>) => void;
}) {
  const choose = (value: string): void => {
    const isGroup = value.startsWith(wholeGroup);
    onChange({
      group: isGroup ? value.slice(wholeGroup.length) : '',
      class: isGroup ? '' : value,
    });
  };
  return (
    <Field label="Kind of paper" className="w-full sm:w-52">
      {(props) => (
        <Select
          {...props}
          value={filters.class || (filters.group ? wholeGroup + filters.group : '')}
          onChange={(event) => choose(event.target.value)}
        >
          <option value="">All</option>
          {classGroups.map((group) => (
            <optgroup key={group} label={classGroupLabels[group]}>
              <option value={wholeGroup + group}>{classGroupLabels[group]}: all</option>
              {documentClasses
                .filter((c) => c.group === group)
                .map((c) => (
                  <option key={c.id} value={c.id}>
                    {c.label}
                  </option>
                ))}
            </optgroup>
          ))}
        </Select>
      )}
    </Field>
  );
}
