import type { SubmitEvent } from 'react';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { fieldProblemsOf, sentenceOf } from '../../../lib/api-error.ts';
import { useSignIn } from '../api/sign-in.ts';

function readText(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === 'string' ? value : '';
}

/**
 * E-mail and password; what was typed stays after a refusal. The server checks the fields and says what
 * is wrong with each: the schemas stay out of the first screen, which is to be light.
 */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const signIn = useSignIn();
  const faults = fieldProblemsOf(signIn.error);
  const faultOf = (field: string): string | undefined =>
    faults.find((fault) => fault.field === field)?.message;
  const submit = (event: SubmitEvent<HTMLFormElement>): void => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    signIn.mutate(
      { email: readText(form, 'email'), password: readText(form, 'password') },
      { onSuccess: onSignedIn },
    );
  };
  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-5">
      {signIn.error && faults.length === 0 ? (
        <Banner alert tone="fault">
          {sentenceOf(signIn.error)}
        </Banner>
      ) : null}
      <Field label="E-mail address" error={faultOf('email')}>
        {(control) => (
          <TextInput
            {...control}
            name="email"
            type="email"
            autoComplete="username"
            autoCapitalize="none"
            spellCheck={false}
          />
        )}
      </Field>
      <Field label="Password" error={faultOf('password')}>
        {(control) => (
          <TextInput {...control} name="password" type="password" autoComplete="current-password" />
        )}
      </Field>
      <Button type="submit" tone="primary" busy={signIn.isPending}>
        Sign in
      </Button>
    </form>
  );
}
