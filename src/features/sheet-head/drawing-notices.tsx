import type { NamesMeet } from '#shared/circuit/nets';
import type { SetAside } from '#shared/doc/read-drawing';

/** What the drawing itself has to say: names that meet on one net, records that could not be read. */
export function DrawingNotices({
  namesMeet,
  setAside,
}: {
  namesMeet: readonly NamesMeet[];
  setAside: readonly SetAside[];
}) {
  if (namesMeet.length + setAside.length === 0) return null;
  return (
    <ul aria-label="Notices about the drawing" className="border-b border-rule px-4 py-1.5 text-xs sm:px-6">
      {namesMeet.map(({ kept, names }) => (
        <li key={kept}>
          The names {names.join(', ')} meet on one net, which is called {kept}: delete all but one of them, or part the
          wires.
        </li>
      ))}
      {setAside.length > 0 && (
        <li>
          {setAside.length === 1 ? 'One record of this sheet' : `${setAside.length} records of this sheet`} could not be
          read and {setAside.length === 1 ? 'was' : 'were'} set aside (
          {setAside.map(({ map, key }) => `${map}: ${key}`).join(', ')}); the rest works.
        </li>
      )}
    </ul>
  );
}
