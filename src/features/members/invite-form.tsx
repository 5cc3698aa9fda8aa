import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { ROLES, type Role } from '#shared/access/roles';
import { emailField, roleField } from '#shared/api/fields';
import { refuseForm } from '../../api/form-refusal';
import { useCreateInvitation } from '../../api/invitations';
import { Button } from '../../ui/button';
import { SelectField, TextField } from '../../ui/field';
import { Failure } from '../../ui/notice';
import { NewLink } from './new-link';

// An empty field is an invitation for whoever has the link.
const form = z.object({ role: roleField, email: z.union([z.literal(''), emailField]) });

/** Makes a link that brings one person into the team. */
export function InviteForm({ teamId }: { readonly teamId: string }) {
  const create = useCreateInvitation(teamId);
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, setError, reset, formState } = useForm({
    resolver: zodResolver(form),
    defaultValues: { role: 'designer' as Role, email: '' },
  });
  const submit = async ({ role, email }: z.output<typeof form>) => {
    setRefusal(null);
    try {
      await create.mutateAsync(email === '' ? { role } : { role, email });
      reset({ role, email: '' });
    } catch (error) {
      setRefusal(refuseForm(error, ['role', 'email'], setError));
    }
  };
  return (
    <section>
      <h2 className="text-xs text-faint">Invite somebody</h2>
      <form noValidate onSubmit={handleSubmit(submit)} className="mt-3 flex flex-col gap-3">
        {refusal !== null && <Failure>{refusal}</Failure>}
        <SelectField label="As" error={formState.errors.role?.message} {...register('role')}>
          {ROLES.map((role) => (
            <option key={role}>{role}</option>
          ))}
        </SelectField>
        <TextField
          label="E-mail address (may stay empty)"
          type="email"
          autoComplete="off"
          hint="With an address, only its account can take the link."
          error={formState.errors.email?.message}
          {...register('email')}
        />
        <Button type="submit" look="strong" busy={formState.isSubmitting}>
          Make a link
        </Button>
      </form>
      {create.data && <NewLink key={create.data.link} link={create.data.link} invitation={create.data.invitation} />}
    </section>
  );
}
