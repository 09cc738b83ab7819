import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { AboutForm } from '../../../src/features/households/components/about-form.tsx';
import { buildHousehold, householdId } from '../support/people.ts';
import { renderScreen } from '../support/render-screen.tsx';
import { problem, stubApi } from '../support/stub-api.ts';

const patch = `PATCH /api/households/${householdId}`;

describe('about the household', () => {
  it('sends only what was changed, against the version that was seen', async () => {
    const calls = stubApi({
      [patch]: () => ({ body: buildHousehold({ version: 5, hopes: 'A clear desk' }) }),
    });
    const { user } = renderScreen(<AboutForm household={buildHousehold()} />);
    await user.type(screen.getByRole('textbox', { name: 'What they hope for' }), 'A clear desk');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText('Everything is saved.')).toBeInTheDocument();
    expect(calls[0]?.body).toEqual({ hopes: 'A clear desk' });
    expect(calls[0]?.headers.get('If-Match')).toBe('"4"');
  });

  it('ties a fault to its field and sends nothing', async () => {
    const calls = stubApi({});
    const { user } = renderScreen(<AboutForm household={buildHousehold()} />);
    const name = screen.getAllByRole('textbox', { name: 'Name' })[0];
    if (!name) throw new Error('There is no field for the name.');
    await user.clear(name);
    await user.click(screen.getByRole('button', { name: 'Save' }));
    await waitFor(() => expect(name).toBeInvalid());
    expect(name).toHaveAccessibleDescription('Enter a name for the household.');
    expect(calls).toEqual([]);
  });

  it('lays both versions side by side after a clash, and keeps what the person chooses', async () => {
    const theirs = buildHousehold({ version: 5, name: 'Pennelow family', hopes: 'Find the deeds' });
    let tries = 0;
    const calls = stubApi({
      [patch]: (call) => {
        tries += 1;
        return tries === 1
          ? problem(412, 'Somebody else changed it.', { current: theirs })
          : { body: { ...theirs, ...(call.body as object), version: 6 } };
      },
    });
    const { user } = renderScreen(<AboutForm household={buildHousehold()} />);
    const name = screen.getAllByRole('textbox', { name: 'Name' })[0];
    if (!name) throw new Error('There is no field for the name.');
    await user.clear(name);
    await user.type(name, 'The Pennelows');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    const dialog = await screen.findByRole('dialog', { name: /Somebody else saved this/ });
    expect(within(dialog).getByText('The Pennelows')).toBeInTheDocument();
    expect(within(dialog).getByText('Pennelow family')).toBeInTheDocument();
    await user.click(within(dialog).getByRole('button', { name: 'Keep mine' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(calls[1]?.headers.get('If-Match')).toBe('"5"');
    expect(calls[1]?.body).toEqual({ name: 'The Pennelows' });
    expect(screen.getByRole('textbox', { name: 'What they hope for' })).toHaveValue(
      'Find the deeds',
    );
  });
});
