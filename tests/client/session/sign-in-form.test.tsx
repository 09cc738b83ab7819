import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { sessionEndpoints } from '../../../server/contract/sessions.ts';
import { SignInForm } from '../../../src/features/session/components/sign-in-form.tsx';
import { ownerSession } from '../support/people.ts';
import { renderScreen } from '../support/render-screen.tsx';
import { problem, stubApi } from '../support/stub-api.ts';

const { method, path } = sessionEndpoints.signIn;
const signIn = `${method.toUpperCase()} ${path}`;
const signedOut = { user: null, memberships: [], csrfToken: 'before' };

describe('signing in', () => {
  it('sends what was typed and leads on', async () => {
    const calls = stubApi({ [signIn]: () => ({ body: ownerSession }) });
    const onSignedIn = vi.fn();
    const { user } = renderScreen(<SignInForm onSignedIn={onSignedIn} />, signedOut);
    await user.type(screen.getByLabelText('E-mail address'), 'owner@practice.example');
    await user.type(screen.getByLabelText('Password'), 'a long password');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    await waitFor(() => expect(onSignedIn).toHaveBeenCalledOnce());
    expect(calls[0]?.body).toEqual({
      email: 'owner@practice.example',
      password: 'a long password',
    });
    expect(calls[0]?.headers.get('X-CSRF-Token')).toBe('before');
  });

  it('shows a refusal and keeps what was typed', async () => {
    stubApi({ [signIn]: () => problem(401, 'The address or the password is not right.') });
    const { user } = renderScreen(<SignInForm onSignedIn={vi.fn()} />, signedOut);
    await user.type(screen.getByLabelText('E-mail address'), 'owner@practice.example');
    await user.type(screen.getByLabelText('Password'), 'guess');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(await screen.findByRole('alert')).toHaveTextContent(
      'The address or the password is not right.',
    );
    expect(screen.getByLabelText('E-mail address')).toHaveValue('owner@practice.example');
  });

  it('ties the server’s findings to the fields', async () => {
    stubApi({
      [signIn]: () =>
        problem(422, 'Look at the fields.', {
          fields: [{ field: 'email', message: 'Enter your e-mail address.' }],
        }),
    });
    const { user } = renderScreen(<SignInForm onSignedIn={vi.fn()} />, signedOut);
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
    const email = screen.getByLabelText('E-mail address');
    await waitFor(() => expect(email).toBeInvalid());
    expect(email).toHaveAccessibleDescription('Enter your e-mail address.');
    expect(screen.getByLabelText('Password')).toBeValid();
  });
});
