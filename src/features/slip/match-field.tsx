import type { DrawnComponent } from '#shared/circuit/drawing';
import { freeGroupName, groupMembers, membersDiffer } from '#shared/circuit/match-group';
import type { SheetCommands } from '../../live/sheet-commands';
import { ChosenField, ShownValue } from './fields';
import { useSheetParts } from './sheet-parts';
import { SlipButton } from './slip-button';

/** The group whose values are kept equal: to join one, to begin one, to leave it, and to mend one that edits made at once left apart. */
export function MatchField({ part, commands }: { part: DrawnComponent; commands: SheetCommands }) {
  const parts = useSheetParts();
  const { match = '' } = part.values;
  const members = groupMembers(parts, part.kind, part.values.match);
  const others = members.filter(({ id }) => id !== part.id).map(({ ref }) => ref);
  const only = new Set([part.id]);
  const choose = (name: string) => {
    if (name === '') commands.unmatchParts(only);
    else commands.matchParts(only, name);
  };
  return (
    <>
      <ChosenField
        name="match"
        label="equal"
        value={match}
        options={choices(part, parts)}
        onChoose={choose}
        canEdit={commands.canEdit}
        note={match === '' ? undefined : others.length > 0 ? `with ${others.join(', ')}` : 'with no other yet'}
      />
      {membersDiffer(members) && (
        <ShownValue label="">
          <span role="alert" className="block text-missed">
            Edits made at once left the values of {match} apart.
          </span>
          {commands.canEdit && (
            <SlipButton onClick={() => commands.equalise(part.id)}>Give all the values of {part.ref}</SlipButton>
          )}
        </ShownValue>
      )}
    </>
  );
}

function choices(part: DrawnComponent, parts: ReturnType<typeof useSheetParts>) {
  const names = new Set(
    parts.flatMap((other) => (other.kind === part.kind && other.values.match ? [other.values.match] : [])),
  );
  const free = freeGroupName(parts);
  return [
    { value: '', text: 'none' },
    ...[...names].sort().map((name) => ({ value: name, text: name })),
    ...(part.values.match === undefined ? [{ value: free, text: `${free}, new` }] : []),
  ];
}
