/** How long news of a team's list is gathered before it is told, in milliseconds. */
const GATHER = 250;

/** Tells teams that their list of sheets has changed without any sheet having been made, renamed or put away. */
export interface ListNews {
  ofSheet(sheetId: string): void;
  ofTeam(teamId: string): void;
  /** Tells nothing more. */
  end(): void;
}

interface ListNewsDeps {
  readonly teamOf: (sheetId: string) => string | undefined;
  readonly tell: (teamId: string) => void;
  /** News is nothing that an edit or a leave should fail for. */
  readonly onError: (error: unknown) => void;
}

export function createListNews({ teamOf, tell, onError }: ListNewsDeps): ListNews {
  const pending = new Map<string, NodeJS.Timeout>();
  let ended = false;
  const attempt = (act: () => void) => {
    try {
      act();
    } catch (error) {
      onError(error);
    }
  };
  const ofTeam = (teamId: string) => {
    if (ended || pending.has(teamId)) return;
    const tellNow = () => {
      pending.delete(teamId);
      attempt(() => tell(teamId));
    };
    pending.set(teamId, setTimeout(tellNow, GATHER));
  };
  return {
    ofTeam,
    ofSheet: (sheetId) => {
      if (ended) return;
      attempt(() => {
        const teamId = teamOf(sheetId);
        if (teamId !== undefined) ofTeam(teamId);
      });
    },
    end: () => {
      ended = true;
      for (const timer of pending.values()) clearTimeout(timer);
    },
  };
}
