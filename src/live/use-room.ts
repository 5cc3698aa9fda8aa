import { useCallback, useEffect, useState, useSyncExternalStore } from 'react';
import { type Denial, openRoom, type Room, type RoomState } from './room';

const OPENING: RoomState = { kind: 'opening', unreachable: false };

/** The live room of a sheet for as long as the component is there; `onDenied` must be stable. */
export function useRoom(
  sheetId: string,
  onDenied: (denial: Denial) => void,
): { room: Room | undefined; state: RoomState } {
  const [room, setRoom] = useState<Room>();
  useEffect(() => {
    const opened = openRoom(sheetId, onDenied);
    setRoom(opened);
    return () => opened.close();
  }, [sheetId, onDenied]);
  const subscribe = useCallback((listener: () => void) => room?.subscribe(listener) ?? (() => undefined), [room]);
  const state = useSyncExternalStore(subscribe, () => room?.state() ?? OPENING);
  return { room, state };
}
