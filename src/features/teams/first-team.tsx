import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { type CreateTeamBody, createTeamBody } from '#shared/api/teams';
import { refuseForm } from '../../api/form-refusal';
import { useCreateTeam } from '../../api/teams';
import { Button } from '../../ui/button';
import { TextField } from '../../ui/field';
import { Failure } from '../../ui/notice';
import { PageTitle } from '../../ui/page-title';

/** For a person who is in no team, for instance after leaving their last: make one, or wait for an invitation. */
export function FirstTeam() {
  const create = useCreateTeam();
  const [refusal, setRefusal] = useState<string | null>(null);
  const { register, handleSubmit, setError, formState } = useForm({
    resolver: zodResolver(createTeamBody),
    defaultValues: { name: '' },
  });
  const submit = async (body: CreateTeamBody) => {
    setRefusal(null);
    try {
      await create.mutateAsync(body);
    } catch (error) {
      setRefusal(refuseForm(error, ['name'], setError));
    }
  };
  return (
    <div className="max-w-md">
      <PageTitle className="mb-2 text-xl">You are in no team</PageTitle>
      <p className="mb-6">
        Sheets belong to a team. Make one here, or open an invitation link that somebody sends you.
      </p>
      <form noValidate onSubmit={handleSubmit(submit)} className="flex flex-col gap-4">
        {refusal !== null && <Failure>{refusal}</Failure>}
        <TextField label="Team name" error={formState.errors.name?.message} {...register('name')} />
        <Button look="strong" type="submit" busy={formState.isSubmitting} className="self-start">
          Make the team
        </Button>
      </form>
    </div>
  );
}
