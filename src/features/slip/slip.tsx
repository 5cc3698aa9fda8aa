import { X } from 'lucide-react';
import { type KeyboardEvent, useEffect, useRef, useState } from 'react';
import { standingOf } from '#shared/analyses/verdict';
import { catalogueEntry } from '#shared/circuit/catalogue';
import { type DrawnFet, type DrawnPart, isComponent, isFet, type SheetSettings } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { formatValue } from '#shared/units/format-value';
import { dimmed } from '../../formats/dimmed';
import { REGION_COLOUR, RegionGlyph } from '../../formats/region-glyph';
import { VerdictOutline } from '../../formats/verdict-outline';
import type { FieldEditor } from '../../live/presence';
import type { SheetCommands } from '../../live/sheet-commands';
import { ValueField } from '../../ui/value-field';
import { useFetPoint, useSolution } from '../../workers/solution';
import { DeviceFigure } from './device-figure';
import { EditedValue, Editors, useEditing } from './editing';
import { ParameterList } from './parameter-list';
import { PartFields } from './part-fields';
import { readReference } from './read-fields';
import { VerdictLine } from './verdict-line';

type SlipProps = {
  part: DrawnPart;
  settings: SheetSettings;
  nets: DrawnNets;
  commands: SheetCommands;
  onClose(): void;
  /** Others who are at a value of this part now. */
  editors?: readonly FieldEditor[];
  /** The value that is being edited here; undefined for none. */
  onEditing?(field: string | undefined): void;
};

const NOBODY: readonly FieldEditor[] = [];

/** The card at the selected part: its values, what it is meant to do, and how it stands. Whoever opens it places it. */
export function Slip({ part, settings, nets, commands, onClose, editors = NOBODY, onEditing }: SlipProps) {
  const card = useRef<HTMLElement>(null);
  const firstField = useRef<HTMLElement>(null);
  const verdict = useVerdict(part);
  const editing = useEditing(onEditing);
  const [asTable, setAsTable] = useState(false);

  useEffect(() => {
    (firstField.current ?? card.current)?.focus({ preventScroll: true });
  }, []);

  const press = (event: KeyboardEvent) => {
    // What is typed here is for the card alone: letters place no part, Delete removes none.
    event.stopPropagation();
    if (event.key === 'Escape') onClose();
    if (event.key === 't' && isFet(part) && !isTyping(event)) setAsTable((before) => !before);
  };

  const name = isComponent(part) ? part.ref : catalogueEntry(part.kind).label;
  const fields = <PartFields part={part} settings={settings} nets={nets} commands={commands} firstField={firstField} />;
  const flagged = verdict === 'thin' || verdict === 'missed' ? verdict : undefined;
  return (
    <Editors value={editors}>
      <section
        ref={card}
        {...editing}
        tabIndex={-1}
        aria-label={`${name}: values`}
        onKeyDown={press}
        className={`relative isolate text-xs shadow-slip outline-none ${
          isFet(part) ? 'w-[17rem] @min-[32rem]:w-[30.25rem]' : 'w-60'
        } ${flagged ? '' : 'border border-edge bg-sheet'}`}
      >
        {flagged && <VerdictOutline verdict={flagged} />}
        {/* As high as the room it is given, and scrolled within: a container's height where there is one, else the window's. */}
        <div className="grid max-h-[calc(100cqh-1.25rem)] gap-2 overflow-y-auto p-3">
          <header className="flex min-h-6 items-center gap-2 pr-6">
            <Name part={part} commands={commands} />
            {isFet(part) && <RegionAndCurrent part={part} />}
            <button
              type="button"
              aria-label="Close"
              onClick={onClose}
              className={`absolute right-2 grid size-6 place-items-center text-faint hover:text-ink ${flagged ? 'top-4' : 'top-3'}`}
            >
              <X size={14} aria-hidden="true" />
            </button>
          </header>
          {isFet(part) ? (
            <div className="grid items-start gap-x-5 gap-y-2 @min-[32rem]:grid-cols-[12.25rem_15rem]">
              {fields}
              <DeviceFigure part={part} asTable={asTable} onTable={setAsTable} />
              <div className="@min-[32rem]:col-span-2">
                <VerdictLine part={part} />
                <ParameterList part={part} settings={settings} commands={commands} />
              </div>
            </div>
          ) : (
            fields
          )}
        </div>
      </section>
    </Editors>
  );
}

function Name({ part, commands }: { part: DrawnPart; commands: SheetCommands }) {
  if (!isComponent(part)) return <h2 className="font-bold text-sm">{catalogueEntry(part.kind).label}</h2>;
  if (!commands.canEdit) return <h2 className="font-bold text-sm">{part.ref}</h2>;
  return (
    <div className="min-w-0 flex-1">
      <EditedValue name="ref">
        <ValueField
          label="reference"
          hideLabel
          value={part.ref}
          show={(ref) => ref}
          read={readReference}
          onCommit={(ref) => commands.setReference(part, ref)}
          className="font-bold text-sm"
        />
      </EditedValue>
    </div>
  );
}

function RegionAndCurrent({ part }: { part: DrawnFet }) {
  const point = useFetPoint(part.ref);
  const { state } = useSolution();
  const busy = state !== 'current' && state !== 'failed';
  if (!point) return <p className="text-faint">{busy ? 'solving' : 'not solved'}</p>;
  return (
    <p aria-busy={busy} className={`flex items-center gap-1.5 ${dimmed(busy)}`}>
      <RegionGlyph region={point.region} />
      <span className={`font-bold ${REGION_COLOUR[point.region]}`}>{point.region}</span>
      <span title={formatValue(point.id, 'A', 4)}>{formatValue(point.id, 'A')}</span>
    </p>
  );
}

function useVerdict(part: DrawnPart) {
  const point = useFetPoint(isFet(part) ? part.ref : '');
  return point && isFet(part) && part.values.intent ? standingOf(point, part.values.intent).verdict : undefined;
}

/** Whether a letter is meant for a field. */
function isTyping({ target, ctrlKey, metaKey, altKey }: KeyboardEvent): boolean {
  return ctrlKey || metaKey || altKey || (target as Element).matches('input:not([type="checkbox"]), select, textarea');
}
