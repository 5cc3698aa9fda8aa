import { useSearchParams } from 'react-router-dom';
import type { OwnTeam } from '#shared/api/accounts';
import { useSession } from '../../api/session';

const KEPT_AS = 'stillpoint.team';

/**
 * The team whose pages are shown: the one the address names (`?team=`), else the one this browser showed last, else
 * the first; null for a person in no team.
 */
export function useTeam(): OwnTeam | null {
  const { teams } = useSession();
  const [search] = useSearchParams();
  const named = search.get('team') ?? lastTeam();
  return teams.find((team) => team.id === named) ?? teams[0] ?? null;
}

export function keepTeam(teamId: string): void {
  try {
    localStorage.setItem(KEPT_AS, teamId);
  } catch {
    // The browser keeps nothing for us; the address still names the team.
  }
}

function lastTeam(): string | null {
  try {
    return localStorage.getItem(KEPT_AS);
  } catch {
    return null;
  }
}
