import { valueFields } from '#shared/circuit/catalogue';
import { regionSchema } from '#shared/circuit/circuit-file';
import {
  type DrawnFet,
  type DrawnPart,
  isComponent,
  isFet,
  type PartId,
  type SheetSettings,
} from '#shared/circuit/drawing';
import { formatExact } from '#shared/units/format-value';
import { parseValue } from '#shared/units/parse-value';
import type { SheetCommands } from '../../live/sheet-commands';
import type { Read } from '../../ui/value-field';
import { commonValue, SEVERAL } from './common-value';
import { ChosenField, ShownValue, TypedField } from './fields';
import { readCount, readMargin, readNetName, readPositive } from './read-fields';
import { sizingOf } from './sizing';

type SeveralFieldsProps<Part> = {
  parts: readonly Part[];
  settings: SheetSettings;
  commands: SheetCommands;
};

/** The fields of parts that have the same values to set: each shows what they have in common, or that they differ. */
export function SeveralFields({ parts, settings, commands }: SeveralFieldsProps<DrawnPart>) {
  const fets = parts.filter(isFet);
  const components = parts.filter(isComponent);
  const sizings = new Set(fets.map(sizingOf));
  const [first] = components;
  if (!first) {
    return (
      <CommonField
        name="net"
        label="net"
        parts={parts}
        readValue={(part) => (part.kind === 'supply' || part.kind === 'net-name' ? part.values.net : '')}
        show={String}
        read={readNetName}
        commands={commands}
      />
    );
  }
  const takesAnySign = first.kind === 'voltage' || first.kind === 'current';
  return (
    <>
      {sizings.size > 1 ? (
        <ShownValue label="sized by">several ways</ShownValue>
      ) : (
        valueFields(first).map(({ name, label, quantity }) => (
          <CommonField
            key={name}
            name={name}
            label={label}
            parts={components}
            readValue={({ values }) => (values as Readonly<Record<string, unknown>>)[name]}
            show={(value) => (typeof value === 'number' ? formatExact(value, quantity.unit) : '')}
            read={(text) => (takesAnySign ? parseValue(text, quantity) : readPositive(text, quantity))}
            commands={commands}
          />
        ))
      )}
      {fets.length > 0 && <SeveralFetFields parts={fets} settings={settings} commands={commands} />}
    </>
  );
}

function SeveralFetFields({ parts, settings, commands }: SeveralFieldsProps<DrawnFet>) {
  const intents = parts.map(({ values }) => values.intent);
  const setIntent = (change: { region?: string; margin?: number } | null) =>
    commands.setValues(
      new Map(
        parts.map(({ id, values }) => [id, { intent: change === null ? null : { ...values.intent, ...change } }]),
      ),
    );
  return (
    <>
      <CommonField
        name="count"
        label="count"
        parts={parts}
        readValue={({ values }) => values.count ?? 1}
        show={String}
        read={readCount}
        commands={commands}
      />
      <CommonChoice
        name="process"
        label="process"
        value={commonValue(parts, ({ values }) => values.process ?? '')}
        choices={Object.keys(settings.processes)}
        onChoose={(process) => commands.setValues(forAll(parts, { process: process === '' ? null : process }))}
        canEdit={commands.canEdit}
      />
      <CommonChoice
        name="intent"
        label="intent"
        value={commonValue(intents, (intent) => intent?.region ?? '')}
        choices={regionSchema.options}
        onChoose={(region) => setIntent(region === '' ? null : { region })}
        canEdit={commands.canEdit}
      />
      {intents.every((intent) => intent !== undefined) && (
        <TypedField
          name="margin"
          label="margin"
          value={commonValue(intents, (intent) => intent?.margin ?? 0)}
          show={(value) => (typeof value === 'number' ? formatExact(value, 'V') : 'several')}
          read={readMargin}
          onCommit={(margin) => (typeof margin === 'number' ? setIntent({ margin }) : undefined)}
          canEdit={commands.canEdit}
        />
      )}
    </>
  );
}

/** A typed value that is set in all parts at once. */
function CommonField<Part extends DrawnPart>({
  name,
  label,
  parts,
  readValue,
  show,
  read,
  commands,
}: {
  name: string;
  label: string;
  parts: readonly Part[];
  readValue: (part: Part) => unknown;
  show: (value: unknown) => string;
  read: (text: string) => Read<unknown>;
  commands: SheetCommands;
}) {
  return (
    <TypedField
      name={name}
      label={label}
      value={commonValue(parts, readValue)}
      show={(value) => (value === SEVERAL ? 'several' : show(value))}
      read={read}
      onCommit={(value) => commands.setValues(forAll(parts, { [name]: value }))}
      canEdit={commands.canEdit}
    />
  );
}

function CommonChoice({
  name,
  label,
  value,
  choices,
  onChoose,
  canEdit,
}: {
  name: string;
  label: string;
  value: string | typeof SEVERAL | undefined;
  choices: readonly string[];
  onChoose: (value: string) => void;
  canEdit: boolean;
}) {
  const differ = value === SEVERAL;
  const present = differ || value === undefined ? SEVERAL_CHOICE : value;
  const named = choices.includes(present) || present === '' || differ ? choices : [...choices, present];
  return (
    <ChosenField
      name={name}
      label={label}
      value={present}
      options={[
        ...(differ ? [{ value: SEVERAL_CHOICE, text: 'several' }] : []),
        { value: '', text: 'none' },
        ...named.map((choice) => ({ value: choice, text: choice })),
      ]}
      onChoose={(choice) => choice !== SEVERAL_CHOICE && onChoose(choice)}
      canEdit={canEdit}
    />
  );
}

/** No process can be called so, for names in the list have no space before them. */
const SEVERAL_CHOICE = ' several';

function forAll(
  parts: readonly DrawnPart[],
  change: Readonly<Record<string, unknown>>,
): ReadonlyMap<PartId, typeof change> {
  return new Map(parts.map(({ id }) => [id, change]));
}
