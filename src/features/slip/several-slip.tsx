import { X } from 'lucide-react';
import { type KeyboardEvent, useEffect, useRef } from 'react';
import { catalogueEntry } from '#shared/circuit/catalogue';
import { type DrawnPart, isComponent, isFet, type SheetSettings } from '#shared/circuit/drawing';
import type { SheetCommands } from '../../live/sheet-commands';
import { FieldGrid } from './fields';
import { SeveralFields } from './several-fields';
import { SeveralMatch } from './several-match';

type SeveralSlipProps = {
  /** More than one. */
  parts: readonly DrawnPart[];
  settings: SheetSettings;
  commands: SheetCommands;
  onClose(): void;
};

/** The card of several selected parts: what a value is set to here, it is set to in all of them, in one step. */
export function SeveralSlip({ parts, settings, commands, onClose }: SeveralSlipProps) {
  const card = useRef<HTMLElement>(null);
  const sorts = sortsOf(parts);
  useEffect(() => {
    (card.current?.querySelector<HTMLElement>('input, select') ?? card.current)?.focus({ preventScroll: true });
  }, []);
  const press = (event: KeyboardEvent) => {
    // What is typed here is for the card alone: letters place no part, Delete removes none.
    event.stopPropagation();
    if (event.key === 'Escape') onClose();
  };
  return (
    <section
      ref={card}
      tabIndex={-1}
      aria-label={`${parts.length} parts: values`}
      onKeyDown={press}
      className="relative isolate w-60 border border-edge bg-sheet text-xs shadow-slip outline-none"
    >
      <div className="grid max-h-[calc(100cqh-1.25rem)] gap-3 overflow-y-auto p-3">
        <header className="flex min-h-6 items-center pr-6">
          <h2 className="font-bold text-sm">{headed(parts.length, sorts)}</h2>
          <button
            type="button"
            aria-label="Close"
            onClick={onClose}
            className="absolute top-3 right-2 grid size-6 place-items-center text-faint hover:text-ink"
          >
            <X size={14} aria-hidden="true" />
          </button>
        </header>
        {sorts.map(({ name, members }) => (
          <section key={name} aria-label={name}>
            {sorts.length > 1 && (
              <h3 className="mb-1 border-rule border-b">
                {name}, {members.length}
              </h3>
            )}
            <FieldGrid>
              <SeveralFields parts={members} settings={settings} commands={commands} />
            </FieldGrid>
          </section>
        ))}
        {sorts.length === 0 && <p className="text-faint">None of these has a value to set.</p>}
        <SeveralMatch parts={parts} commands={commands} />
      </div>
    </section>
  );
}

type Sort = { readonly name: string; readonly members: readonly DrawnPart[] };

/** Parts that have the same values to set: FETs, whatever their polarity, and names of nets, whatever their symbol. */
function sortsOf(parts: readonly DrawnPart[]): Sort[] {
  const sorts = new Map<string, DrawnPart[]>();
  for (const part of parts) {
    const name = sortOf(part);
    if (name !== undefined) sorts.set(name, [...(sorts.get(name) ?? []), part]);
  }
  return [...sorts].map(([name, members]) => ({ name, members }));
}

function sortOf(part: DrawnPart): string | undefined {
  if (isFet(part)) return 'FETs';
  if (isComponent(part)) return `${catalogueEntry(part.kind).label}s`;
  return part.kind === 'supply' || part.kind === 'net-name' ? 'net names' : undefined;
}

function headed(count: number, [only, ...more]: readonly Sort[]): string {
  return only && more.length === 0 && only.members.length === count ? `${count} ${only.name}` : `${count} parts`;
}
