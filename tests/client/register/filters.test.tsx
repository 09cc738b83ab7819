import { screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { RegisterFilters } from '../../../src/features/register/components/register-filters.tsx';
import {
  nextSort,
  readView,
  toQuery,
  writeView,
} from '../../../src/features/register/logic/filters.ts';
import { renderScreen } from '../support/render-screen.tsx';

const none = readView(new URLSearchParams()).filters;

describe('a view of the register', () => {
  it('goes into the address and comes back out of it', () => {
    const address = 'q=water&class=utility-bill&dueBy=2026-12-01&sort=-keepUntil&page=3';
    const view = readView(new URLSearchParams(address));
    expect(view.page).toBe(3);
    expect(writeView(view).toString()).toBe(address);
    expect(toQuery(view)).toMatchObject({ q: 'water', dueBy: '2026-12-01', sort: '-keepUntil' });
  });

  it('sorts up, then down, then as usual', () => {
    expect(nextSort('number', 'issuer')).toBe('issuer');
    expect(nextSort('issuer', 'issuer')).toBe('-issuer');
    expect(nextSort('-issuer', 'issuer')).toBe('number');
  });
});

describe('the filters', () => {
  it('choose a kind of paper, or its whole group', async () => {
    const onChange = vi.fn();
    const { user } = renderScreen(
      <RegisterFilters filters={none} boxes={[]} onChange={onChange} onClear={vi.fn()} />,
    );
    const kinds = screen.getByLabelText('Kind of paper');
    await user.selectOptions(kinds, 'Passport');
    expect(onChange).toHaveBeenLastCalledWith({ class: 'passport', group: '' });
    await user.selectOptions(kinds, 'Tax: all');
    expect(onChange).toHaveBeenLastCalledWith({ class: '', group: 'tax' });
  });

  it('show a date that came with the address, and take it off', async () => {
    const onChange = vi.fn();
    const { user } = renderScreen(
      <RegisterFilters
        filters={{ ...none, dueBy: '2026-12-01' }}
        boxes={[]}
        onChange={onChange}
        onClear={vi.fn()}
      />,
    );
    await user.click(screen.getByRole('button', { name: /May go by 1 December 2026/ }));
    expect(onChange).toHaveBeenCalledWith({ dueBy: '' });
  });
});
