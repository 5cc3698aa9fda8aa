import { isInvented } from '#shared/circuit/built-in-process';
import { regionSchema } from '#shared/circuit/circuit-file';
import { isDepletion } from '#shared/circuit/depletion';
import type { DrawnFet, SheetSettings } from '#shared/circuit/drawing';
import { formatExact } from '#shared/units/format-value';
import type { SheetCommands } from '../../live/sheet-commands';
import { EditedValue } from './editing';
import { ChosenField, ShownValue, TypedField } from './fields';
import { readCount, readMargin } from './read-fields';
import { resized, type Sizing, sizingOf } from './sizing';

const NO_CHOICE = { value: '', text: 'none' };
const SIZINGS = [
  { value: 'channel', text: 'W and L' },
  { value: 'k', text: 'its own k' },
];
const REGIONS = [NO_CHOICE, ...regionSchema.options.map((region) => ({ value: region, text: region }))];

/** What a FET has beside its size: how it is sized, how many there are, its process, its body, and what it is meant to do. */
export function FetFields({
  part,
  settings,
  commands,
}: {
  part: DrawnFet;
  settings: SheetSettings;
  commands: SheetCommands;
}) {
  const { canEdit } = commands;
  const { count = 1, process = '', intent, bodyLedOut = false } = part.values;
  const chooseSizing = (sizing: string) =>
    commands.setValues(new Map([[part.id, resized(part, sizing as Sizing, settings.processes)]]));
  const chooseIntent = (region: string) =>
    commands.setValue(part, 'intent', region === '' ? null : { ...intent, region });

  return (
    <>
      <ChosenField
        name="k"
        label="sized by"
        value={sizingOf(part)}
        options={SIZINGS}
        onChoose={chooseSizing}
        canEdit={canEdit}
      />
      <TypedField
        name="count"
        label="count"
        value={count}
        show={String}
        read={readCount}
        onCommit={(value) => commands.setValue(part, 'count', value)}
        canEdit={canEdit}
      />
      <ChosenField
        name="process"
        label="process"
        value={process}
        options={processChoices(process, settings.processes)}
        onChoose={(name) => commands.setValue(part, 'process', name === '' ? null : name)}
        canEdit={canEdit}
        note={isInvented(process) ? 'invented figures' : undefined}
      />
      {isDepletion(part, settings) && <ShownValue label="channel">depletion</ShownValue>}
      <BodyField
        ledOut={bodyLedOut}
        canEdit={canEdit}
        onChange={(ledOut) => commands.setValue(part, 'bodyLedOut', ledOut ? true : null)}
      />
      <ChosenField
        name="intent"
        label="intent"
        value={intent?.region ?? ''}
        options={REGIONS}
        onChoose={chooseIntent}
        canEdit={canEdit}
      />
      {intent && (
        <TypedField
          name="margin"
          label="margin"
          value={intent.margin ?? 0}
          show={(volts) => formatExact(volts, 'V')}
          read={readMargin}
          onCommit={(margin) => commands.setValue(part, 'intent', { ...intent, margin })}
          canEdit={canEdit}
        />
      )}
    </>
  );
}

/** The sheet's processes, and whatever the part names now, though the sheet may not have it. */
function processChoices(present: string, processes: SheetSettings['processes']) {
  const names = Object.keys(processes);
  const unknown = present !== '' && !names.includes(present);
  return [
    NO_CHOICE,
    ...names.map((name) => ({ value: name, text: name })),
    ...(unknown ? [{ value: present, text: `${present} (not on this sheet)` }] : []),
  ];
}

function BodyField({
  ledOut,
  canEdit,
  onChange,
}: {
  ledOut: boolean;
  canEdit: boolean;
  onChange: (ledOut: boolean) => void;
}) {
  if (!canEdit) return <ShownValue label="body">{ledOut ? 'led out' : 'tied to the source'}</ShownValue>;
  return (
    <EditedValue name="bodyLedOut">
      <span className="self-center text-faint">body</span>
      <label className="flex min-h-6 items-center gap-2">
        <input
          type="checkbox"
          aria-label="body led out"
          className="size-3.5 accent-ink"
          checked={ledOut}
          onChange={(event) => onChange(event.target.checked)}
        />
        led out
      </label>
    </EditedValue>
  );
}
