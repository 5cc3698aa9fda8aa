import type { OtherPerson } from '../../live/presence';
import { Initials } from '../../ui/initials';

type PeopleHereProps = {
  own: { name: string; initials: string };
  others: readonly OtherPerson[];
  /** Whose view is followed, by connection. */
  followed: number | undefined;
  onFollow(id: number | undefined): void;
};

/** Who is on this sheet now: oneself filled, the others outlined; a click follows what one of them has in view. */
export function PeopleHere({ own, others, followed, onFollow }: PeopleHereProps) {
  return (
    <ul aria-label="Here now" className="flex gap-1">
      <li title={`${own.name} (you)`}>
        <Initials text={own.initials} own />
        <span className="sr-only">{own.name} (you)</span>
      </li>
      {others.map(({ id, name, initials }) => {
        const follows = followed === id;
        return (
          <li key={id}>
            <button
              type="button"
              aria-pressed={follows}
              title={follows ? `Stop following ${name}` : `Follow what ${name} has in view`}
              className={follows ? 'outline-2 outline-focus' : ''}
              onClick={() => onFollow(follows ? undefined : id)}
            >
              <Initials text={initials} />
              <span className="sr-only">Follow {name}</span>
            </button>
          </li>
        );
      })}
    </ul>
  );
}
