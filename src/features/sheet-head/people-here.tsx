import type { OtherPerson } from '../../live/presence';
import { Initials } from '../../ui/initials';

/** Who is on this sheet now: oneself filled, the others outlined. */
export function PeopleHere({
  own,
  others,
}: {
  own: { name: string; initials: string };
  others: readonly OtherPerson[];
}) {
  return (
    <ul aria-label="Here now" className="flex gap-1">
      <li title={`${own.name} (you)`}>
        <Initials text={own.initials} own />
        <span className="sr-only">{own.name} (you)</span>
      </li>
      {others.map((person) => (
        <li key={person.id} title={person.name}>
          <Initials text={person.initials} />
          <span className="sr-only">{person.name}</span>
        </li>
      ))}
    </ul>
  );
}
