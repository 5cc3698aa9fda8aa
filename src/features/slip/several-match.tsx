import { type DrawnPart, isComponent } from '#shared/circuit/drawing';
import { groupMembers, matchOf, membersDiffer } from '#shared/circuit/match-group';
import type { SheetCommands } from '../../live/sheet-commands';
import { useSheetParts } from './sheet-parts';
import { SlipButton } from './slip-button';

/** Keeps the values of the selected parts equal, or no longer. */
export function SeveralMatch({ parts, commands }: { parts: readonly DrawnPart[]; commands: SheetCommands }) {
  const all = useSheetParts();
  const [first, ...others] = parts;
  if (!commands.canEdit || !first || !isComponent(first) || others.some(({ kind }) => kind !== first.kind)) return null;
  const chosen = new Set(parts.map(({ id }) => id));
  const names = new Set(parts.map(matchOf));
  const [name] = names;
  if (names.size > 1 || name === undefined) {
    const join = [...names].find((one) => one !== undefined);
    return (
      <div>
        <SlipButton onClick={() => commands.matchParts(chosen, join)}>
          {join === undefined ? 'Keep these values equal' : `Let all join the group ${join}`}
        </SlipButton>
      </div>
    );
  }
  const members = groupMembers(all, first.kind, name);
  const beside = members.filter(({ id }) => !chosen.has(id)).map(({ ref }) => ref);
  return (
    <div>
      <p className="text-faint">
        kept equal as {name}
        {beside.length > 0 && `, with ${beside.join(', ')}`}
      </p>
      {membersDiffer(members) && (
        <>
          <p role="alert" className="pt-1 text-missed">
            Edits made at once left the values of {name} apart.
          </p>
          <SlipButton onClick={() => commands.equalise(first.id)}>Give all the values of {first.ref}</SlipButton>
        </>
      )}
      <SlipButton onClick={() => commands.unmatchParts(chosen)}>Keep equal no longer</SlipButton>
    </div>
  );
}
