import { useViewport } from 'reactflow';
import type { PartId } from '#shared/circuit/drawing';
import type { OtherPerson } from '../../live/presence';
import { Brackets, outset } from './brackets';
import type { SheetGeometry } from './sheet-geometry';
import { partBox } from './symbol-box';

type MarksProps = {
  readonly geometry: SheetGeometry;
  readonly selected: ReadonlySet<PartId>;
  readonly lit: ReadonlySet<PartId>;
  readonly others: readonly OtherPerson[];
};

/** Who looks at what: brackets about one's own selection, the ledger's part, and everyone else's, with their initials. */
export function Marks({ geometry, selected, lit, others }: MarksProps) {
  const shown = (ids: ReadonlySet<PartId>) => [...ids].flatMap((id) => geometry.parts.get(id) ?? []);
  return (
    <>
      <svg className="marks" width="1" height="1" aria-hidden="true">
        {others.map(({ id, selection }) =>
          shown(selection).map((part) => <Brackets key={`${id} ${part.id}`} part={part} look="other" />),
        )}
        {shown(lit).map((part) => (
          <Brackets key={part.id} part={part} look="lit" />
        ))}
        {shown(selected).map((part) => (
          <Brackets key={part.id} part={part} look="selected" />
        ))}
      </svg>
      {others.map((person) => (
        <OtherMarks key={person.id} person={person} geometry={geometry} />
      ))}
    </>
  );
}

function OtherMarks({ person, geometry }: { person: OtherPerson; geometry: SheetGeometry }) {
  const { zoom } = useViewport();
  const { initials, selection, pointer } = person;
  return (
    <>
      {[...selection].map((id) => {
        const part = geometry.parts.get(id);
        if (!part) return null;
        const { right, bottom } = outset(partBox(part));
        return (
          <div key={id} className="initials" style={{ left: right, top: bottom, transform: 'translate(-100%, -50%)' }}>
            {initials}
          </div>
        );
      })}
      {pointer && (
        // Drawn at its own size whatever the zoom, as a pointer is.
        <div className="pointer" style={{ left: pointer.x, top: pointer.y, transform: `scale(${1 / zoom})` }}>
          <svg width="12" height="14" aria-hidden="true">
            <path className="pointer-arrow" d="M.5.5V12L4 9L6.5 13.5L8.5 12.5L6 8H10.5Z" />
          </svg>
          <span className="initials">{initials}</span>
        </div>
      )}
    </>
  );
}
