import { ChevronDown } from 'lucide-react';
import { useEffect } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import type { OwnTeam } from '#shared/api/accounts';
import { useSession } from '../../api/session';
import { Menu, MenuChoice } from '../../ui/menu';
import { keepTeam } from './use-team';

/** The team's name; for a person in several, the way to the others. */
export function TeamSwitcher({ team }: { readonly team: OwnTeam }) {
  const { teams } = useSession();
  const navigate = useNavigate();
  const { pathname } = useLocation();
  useEffect(() => keepTeam(team.id), [team.id]);

  if (teams.length < 2) return <p className="truncate text-xl">{team.name}</p>;
  return (
    <Menu
      align="start"
      trigger={
        <button type="button" className="flex min-h-8 max-w-full items-center gap-2 text-xl">
          <span className="truncate">{team.name}</span>
          <ChevronDown size={18} strokeWidth={1.5} className="shrink-0" aria-hidden />
          <span className="sr-only">, choose another team</span>
        </button>
      }
    >
      <MenuChoice
        label="Your teams"
        value={team.id}
        options={teams.map(({ id, name }) => ({ value: id, text: name }))}
        onChange={(id) => navigate({ pathname, search: `?team=${id}` })}
      />
    </Menu>
  );
}
