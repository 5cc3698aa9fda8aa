import type { RefObject } from 'react';
import { valueFields } from '#shared/circuit/catalogue';
import { type DrawnPart, isComponent, isFet, type SheetSettings } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { formatExact } from '#shared/units/format-value';
import { parseValue, type Quantity } from '#shared/units/parse-value';
import type { SheetCommands } from '../../live/sheet-commands';
import { FetFields } from './fet-fields';
import { FieldGrid, ShownValue, TypedField } from './fields';
import { MatchField } from './match-field';
import { NoteField } from './note-field';
import { readNetName, readPositive } from './read-fields';

/** Every value of a part that can be set, the main ones first. */
export function PartFields({
  part,
  settings,
  nets,
  commands,
  firstField,
}: {
  part: DrawnPart;
  settings: SheetSettings;
  nets: DrawnNets;
  commands: SheetCommands;
  /** Filled with the field that takes the focus when the slip opens. */
  firstField: RefObject<HTMLElement | null>;
}) {
  const takesFocus = (element: HTMLElement | null) => {
    firstField.current = element;
  };
  if (part.kind === 'note') {
    return (
      <FieldGrid>
        <NoteField part={part} commands={commands} firstField={firstField} />
      </FieldGrid>
    );
  }
  if (!isComponent(part)) {
    return (
      <FieldGrid>
        {part.kind === 'supply' || part.kind === 'net-name' ? (
          <TypedField
            name="net"
            label="net"
            value={part.values.net}
            show={(name) => name}
            read={readNetName}
            onCommit={(name) => commands.setValue(part, 'net', name)}
            canEdit={commands.canEdit}
            inputRef={takesFocus}
          />
        ) : (
          <ShownValue label="net">{nets.netOf.get(`${part.id}/net`) ?? 'none'}</ShownValue>
        )}
      </FieldGrid>
    );
  }
  const takesAnySign = part.kind === 'voltage' || part.kind === 'current';
  const values: Readonly<Record<string, unknown>> = part.values;
  return (
    <FieldGrid>
      {valueFields(part).map(({ name, label, quantity }, index) => (
        <TypedField
          key={name}
          name={name}
          label={label}
          value={values[name]}
          show={(value) => shown(value, quantity)}
          read={(text) => (takesAnySign ? parseValue(text, quantity) : readPositive(text, quantity))}
          onCommit={(value) => commands.setValue(part, name, value)}
          canEdit={commands.canEdit}
          {...(index === 0 ? { inputRef: takesFocus } : {})}
        />
      ))}
      {isFet(part) && <FetFields part={part} settings={settings} commands={commands} />}
      <MatchField part={part} commands={commands} />
    </FieldGrid>
  );
}

function shown(value: unknown, { unit }: Quantity): string {
  return typeof value === 'number' ? formatExact(value, unit) : '';
}
