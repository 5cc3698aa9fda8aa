import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { type SignInBody, signInBody } from '#shared/api/accounts';
import { refuseForm } from '../../api/form-refusal';
import { useSignIn } from '../../api/session';
import { Button } from '../../ui/button';
import { TextField } from '../../ui/field';
import { Failure } from '../../ui/notice';
import { PasswordField } from '../../ui/password-field';

interface SignInFormProps {
  readonly email?: string | undefined;
  readonly onSignedIn?: () => void;
}

export function SignInForm({ email = '', onSignedIn }: SignInFormProps) {
  const signIn = useSignIn();
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(signInBody),
    defaultValues: { email, password: '' },
  });
  const submit = async (body: SignInBody) => {
    setRefusal(null);
    try {
      await signIn.mutateAsync(body);
    } catch (error) {
      setRefusal(refuseForm(error, ['email', 'password'], setError));
      return;
    }
    onSignedIn?.();
  };
  const { errors } = formState;
  return (
    <form noValidate onSubmit={handleSubmit(submit)} className="flex flex-col gap-4">
      {refusal !== null && <Failure>{refusal}</Failure>}
      <TextField
        label="E-mail address"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...register('email')}
      />
      <PasswordField
        label="Password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...register('password')}
      />
      <Button look="strong" type="submit" busy={formState.isSubmitting} className="mt-2 min-h-10">
        {formState.isSubmitting ? 'Signing in' : 'Sign in'}
      </Button>
    </form>
  );
}
