import { ChevronDown, ChevronRight, Undo2 } from 'lucide-react';
import { useId, useState } from 'react';
import type { DrawnFet, SheetSettings } from '#shared/circuit/drawing';
import type { SheetCommands } from '../../live/sheet-commands';
import { ValueField } from '../../ui/value-field';
import { EditedValue } from './editing';
import { type Parameter, parametersOf, processValue, withParameter } from './parameters';

/** The process's parameters as they hold for one device: what it has of its own is marked, and can be taken back. */
export function ParameterList({
  part,
  settings: { processes },
  commands,
}: {
  part: DrawnFet;
  settings: SheetSettings;
  commands: SheetCommands;
}) {
  const own = Object.keys(part.values.overrides ?? {}).length;
  const [open, setOpen] = useState(own > 0);
  const id = useId();
  const Chevron = open ? ChevronDown : ChevronRight;
  return (
    <div className="pt-1">
      <button
        type="button"
        aria-expanded={open}
        aria-controls={id}
        className="-ml-1 flex min-h-6 items-center gap-1 text-faint hover:text-ink"
        onClick={() => setOpen(!open)}
      >
        <Chevron size={14} aria-hidden="true" />
        parameters
        {own > 0 && <span className="font-bold text-ink">{own} of its own</span>}
      </button>
      {open && (
        <div id={id} className="grid grid-cols-[4.75rem_7.5rem_0_minmax(0,1fr)] items-baseline gap-y-1.5 pt-1">
          {parametersOf(part, processes).map((parameter) => (
            <ParameterRow
              key={parameter.name}
              part={part}
              parameter={parameter}
              fromProcess={processValue(part, processes, parameter.name)}
              commands={commands}
            />
          ))}
        </div>
      )}
    </div>
  );
}

function ParameterRow({
  part,
  parameter: { name, label, meaning, show, read },
  fromProcess,
  commands,
}: {
  part: DrawnFet;
  parameter: Parameter;
  fromProcess: number | undefined;
  commands: SheetCommands;
}) {
  const own = part.values.overrides?.[name];
  const text = (value: number | undefined) => (value === undefined ? '' : show(value));
  const set = (value: number | undefined) =>
    commands.setValue(part, 'overrides', withParameter(part.values.overrides, name, value));
  const weight = own === undefined ? '' : 'font-bold';
  return (
    <>
      {commands.canEdit ? (
        <EditedValue name={`overrides.${name}`}>
          <ValueField
            label={label}
            value={own ?? fromProcess}
            show={text}
            read={read}
            onCommit={set}
            className={weight}
          />
        </EditedValue>
      ) : (
        <>
          <span className="text-faint">{label}</span>
          <span className={`col-span-2 ${weight}`}>{text(own ?? fromProcess)}</span>
        </>
      )}
      <span className="-my-1 flex min-h-4 items-center pl-3" title={meaning}>
        {own === undefined ? (
          <span className="sr-only">{meaning}</span>
        ) : (
          <>
            <span className="text-faint">{fromProcess === undefined ? 'own' : `not ${show(fromProcess)}`}</span>
            {commands.canEdit && (
              <button
                type="button"
                aria-label={`Take back ${label}`}
                title={
                  fromProcess === undefined ? `Take ${label} away` : `Take back the process’s ${show(fromProcess)}`
                }
                className="grid size-6 place-items-center text-faint hover:text-ink"
                onClick={() => set(undefined)}
              >
                <Undo2 size={14} aria-hidden="true" />
              </button>
            )}
          </>
        )}
      </span>
    </>
  );
}
