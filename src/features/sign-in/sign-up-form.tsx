import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { type SignUpBody, signUpBody } from '#shared/api/accounts';
import { refuseForm } from '../../api/form-refusal';
import { useSignUp } from '../../api/session';
import { Button } from '../../ui/button';
import { TextField } from '../../ui/field';
import { Failure } from '../../ui/notice';
import { PasswordField } from '../../ui/password-field';

interface SignUpFormProps {
  /** With it the person joins the team that invited them; without it they get a team of their own. */
  readonly invitation?: string | undefined;
  /** The one address that the invitation is for. */
  readonly email?: string | undefined;
  readonly onSignedUp?: () => void;
}

export function SignUpForm({ invitation, email, onSignedUp }: SignUpFormProps) {
  const signUp = useSignUp();
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(signUpBody),
    defaultValues: { name: '', email: email ?? '', password: '', ...(invitation !== undefined && { invitation }) },
  });
  const submit = async (body: SignUpBody) => {
    setRefusal(null);
    try {
      await signUp.mutateAsync(body);
    } catch (error) {
      setRefusal(refuseForm(error, ['name', 'email', 'password'], setError));
      return;
    }
    onSignedUp?.();
  };
  const { errors } = formState;
  return (
    <form noValidate onSubmit={handleSubmit(submit)} className="flex flex-col gap-4">
      {refusal !== null && <Failure>{refusal}</Failure>}
      <TextField
        label="Name"
        autoComplete="name"
        hint="As your team should read it beside your work."
        error={errors.name?.message}
        {...register('name')}
      />
      <TextField
        label="E-mail address"
        type="email"
        autoComplete="username"
        readOnly={email !== undefined}
        hint={email === undefined ? undefined : 'The invitation is for this address only.'}
        error={errors.email?.message}
        {...register('email')}
      />
      <PasswordField
        label="Password"
        autoComplete="new-password"
        hint="At least 8 characters of any kind; a few words make a good one."
        error={errors.password?.message}
        {...register('password')}
      />
      <Button look="strong" type="submit" busy={formState.isSubmitting} className="mt-2 min-h-10">
        {formState.isSubmitting ? 'Making the account' : 'Make the account'}
      </Button>
    </form>
  );
}
