import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { nameField } from '#shared/api/fields';
import { refuseForm } from '../../api/form-refusal';
import { useCreateSheet } from '../../api/sheets';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { SelectField, TextField } from '../../ui/field';
import { Failure } from '../../ui/notice';
import { aboutOf, BEGINNINGS, type Beginning, keyOf, nameOf } from './beginning';
import { CircuitFileField } from './circuit-file-field';
import type { CircuitFile } from './read-circuit-file';

const form = z.object({ name: nameField });

interface NewSheetDialogProps {
  readonly teamId: string;
  readonly begin: Beginning;
  readonly onBegin: (beginning: Beginning) => void;
  readonly onClose: () => void;
}

/** Names a new sheet and says what it begins from; then opens it. */
export function NewSheetDialog({ teamId, begin, onBegin, onClose }: NewSheetDialogProps) {
  const create = useCreateSheet(teamId);
  const navigate = useNavigate();
  const [refusal, setRefusal] = useState<string | null>(null);
  const [file, setFile] = useState<CircuitFile | null>(null);
  const [fileMissing, setFileMissing] = useState(false);
  const { register, handleSubmit, setError, getFieldState, setValue, formState } = useForm({
    resolver: zodResolver(form),
    defaultValues: { name: begin.kind === 'starter' ? begin.name : '' },
  });

  // A name is offered only until somebody has typed one.
  const offerName = (name: string) => {
    if (!getFieldState('name').isDirty) setValue('name', name);
  };
  const choose = (key: string) => {
    const chosen = BEGINNINGS.find((one) => keyOf(one) === key);
    if (chosen === undefined) return;
    offerName(chosen.kind === 'starter' ? chosen.name : '');
    onBegin(chosen);
  };
  const submit = async ({ name }: z.output<typeof form>) => {
    setRefusal(null);
    if (begin.kind === 'file' && !file?.ok) {
      setFileMissing(file === null);
      return;
    }
    const from =
      begin.kind === 'starter'
        ? { starter: begin.id }
        : begin.kind === 'file' && file?.ok
          ? { circuit: file.circuit }
          : {};
    try {
      const sheet = await create.mutateAsync({ name, ...from });
      navigate(`/sheets/${sheet.id}`);
    } catch (error) {
      setRefusal(refuseForm(error, ['name'], setError));
    }
  };

  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="New sheet">
      <form noValidate onSubmit={handleSubmit(submit)} className="flex flex-col gap-4">
        {refusal !== null && <Failure>{refusal}</Failure>}
        <TextField label="Name" autoComplete="off" error={formState.errors.name?.message} {...register('name')} />
        <SelectField
          label="Begin from"
          value={keyOf(begin)}
          hint={aboutOf(begin)}
          onChange={(event) => choose(event.target.value)}
        >
          {BEGINNINGS.map((beginning) => (
            <option key={keyOf(beginning)} value={keyOf(beginning)}>
              {nameOf(beginning)}
            </option>
          ))}
        </SelectField>
        {begin.kind === 'file' && (
          <CircuitFileField
            read={file}
            missing={fileMissing}
            onRead={(read) => {
              setFile(read);
              setFileMissing(false);
              if (read.ok && read.title !== undefined) offerName(read.title.slice(0, 80));
            }}
          />
        )}
        <div className="mt-2 flex flex-wrap justify-end gap-3">
          <Button onClick={onClose}>Cancel</Button>
          <Button look="strong" type="submit" busy={formState.isSubmitting}>
            {formState.isSubmitting ? 'Making the sheet' : 'Make the sheet'}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
