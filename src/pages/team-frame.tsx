import type { ReactNode } from 'react';
import type { OwnTeam } from '#shared/api/accounts';
import { useSession } from '../api/session';
import { PersonMenu } from '../features/person/person-menu';
import { FirstTeam } from '../features/teams/first-team';
import { TeamSwitcher } from '../features/teams/team-switcher';
import { useTeam } from '../features/teams/use-team';
import { PageFrame } from '../ui/page-frame';

interface TeamFrameProps {
  readonly margin?: (team: OwnTeam) => ReactNode;
  readonly children: (team: OwnTeam) => ReactNode;
}

/** What the pages of a team have in common: its name, the way between them, and who is signed in. */
export function TeamFrame({ margin, children }: TeamFrameProps) {
  const { teams } = useSession();
  const team = useTeam();
  if (team === null) {
    return (
      <PageFrame home="/" title={<p className="text-xl">Stillpoint</p>} places={[]} person={<PersonMenu />}>
        <FirstTeam />
      </PageFrame>
    );
  }
  const named = (path: string) => (teams.length > 1 ? `${path}?team=${team.id}` : path);
  return (
    <PageFrame
      home={named('/')}
      title={<TeamSwitcher team={team} />}
      places={[
        { to: named('/'), text: 'Sheets' },
        { to: named('/team'), text: 'Team' },
      ]}
      person={<PersonMenu />}
      margin={margin?.(team)}
    >
      {children(team)}
    </PageFrame>
  );
}
