import type { RoomState } from '../../live/room';

/** Whether the work is safe: stored by the server, on its way, or only here. */
export function SafeState({ state }: { state: RoomState }) {
  return (
    <p role="status" className={`text-xs whitespace-nowrap ${state.kind === 'offline' ? 'text-missed' : 'text-faint'}`}>
      {wordsFor(state)}
    </p>
  );
}

function wordsFor(state: RoomState): string {
  switch (state.kind) {
    case 'opening':
      return state.unreachable ? 'The server cannot be reached; trying again' : 'opening';
    case 'live':
      return state.notStored === 0 ? 'saved' : 'saving';
    case 'offline':
      return state.notStored === 0 ? 'offline' : `offline, ${changes(state.notStored)} not yet shared`;
    case 'refused':
      return 'closed';
  }
}

function changes(count: number): string {
  return count === 1 ? '1 change' : `${count} changes`;
}
