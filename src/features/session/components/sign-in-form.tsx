import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { signInSchema } from '../../../../server/contract/sessions.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { useSignIn } from '../api/sign-in.ts';

/** E-mail and password; what was typed stays after a refusal. */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const signIn = useSignIn();
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: '', password: '' },
  });
  const submit = handleSubmit((values) => signIn.mutate(values, { onSuccess: onSignedIn }));
  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-5">
      {signIn.error ? (
        <Banner alert tone="danger">
          {sentenceOf(signIn.error)}
        </Banner>
      ) : null}
      <Field label="E-mail address" error={formState.errors.email?.message}>
        {(control) => (
          <TextInput
            {...control}
            {...register('email')}
            type="email"
            inputMode="email"
            autoComplete="username"
            autoCapitalize="none"
            spellCheck={false}
          />
        )}
      </Field>
      <Field label="Password" error={formState.errors.password?.message}>
        {(control) => (
          <TextInput
            {...control}
            {...register('password')}
            type="password"
            autoComplete="current-password"
          />
        )}
      </Field>
      <Button type="submit" tone="primary" busy={signIn.isPending}>
        Sign in
      </Button>
    </form>
  );
}
