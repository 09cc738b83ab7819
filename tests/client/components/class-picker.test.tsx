import { useState } from 'react';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import type { ClassId } from '../../../server/contract/document-classes.ts';
import { ClassPicker } from '../../../src/components/ui/class-picker.tsx';

function Picker({ first = null }: { first?: ClassId | null }) {
  const [value, setValue] = useState<ClassId | null>(first);
  return (
    <>
      <ClassPicker value={value} onChange={setValue} suggested={['utility-bill']} />
      <output>{value}</output>
    </>
  );
}

describe('choosing a kind of paper', () => {
  it('finds it by any word of it and takes it with Enter', async () => {
    const user = userEvent.setup();
    render(<Picker />);
    await user.type(screen.getByRole('combobox', { name: 'Kind of paper' }), 'council{Enter}');
    expect(screen.getByRole('status')).toHaveTextContent('property-tax-bill');
    expect(screen.getByRole('combobox')).toHaveValue('Property or council tax bill');
  });

  it('moves with the arrows and says which option it is on', async () => {
    const user = userEvent.setup();
    render(<Picker />);
    const box = screen.getByRole('combobox');
    await user.type(box, 'bank');
    const [first, second] = screen.getAllByRole('option');
    expect(box).toHaveAttribute('aria-activedescendant', first?.id);
    await user.keyboard('{ArrowDown}');
    expect(box).toHaveAttribute('aria-activedescendant', second?.id);
    expect(second).toHaveAttribute('aria-selected', 'true');
  });

  it('shows the suggested kind first, and gives the value up on Escape unchanged', async () => {
    const user = userEvent.setup();
    render(<Picker first="will" />);
    await user.click(screen.getByRole('combobox'));
    expect(screen.getAllByRole('option')[0]).toHaveTextContent('Utility bill');
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('option')).not.toBeInTheDocument();
    expect(screen.getByRole('combobox')).toHaveValue('Will');
  });

  it('says so when no kind has these words', async () => {
    const user = userEvent.setup();
    render(<Picker />);
    await user.type(screen.getByRole('combobox'), 'zzzz');
    expect(screen.getByText(/No kind of paper has these words/)).toBeInTheDocument();
  });
});
