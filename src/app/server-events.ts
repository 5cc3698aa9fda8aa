import { type QueryClient, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { type ChangeEvent, changeEvent } from '#shared/api/events';
import { keys } from '../api/keys';

/** Asks again for whatever the server says has changed, as long as somebody is signed in. */
export function useServerEvents(signedIn: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!signedIn) return;
    const source = new EventSource('/api/events');
    let missed = false;
    source.onerror = () => {
      missed = true;
    };
    // The stream keeps nothing for those who were away: after a gap anything may have changed.
    source.onopen = () => {
      if (missed) client.invalidateQueries();
      missed = false;
    };
    const onChange = (message: MessageEvent<string>) => {
      const read = changeEvent.safeParse(JSON.parse(message.data));
      if (read.success) refetchFor(client, read.data);
    };
    source.addEventListener('member', onChange);
    source.addEventListener('sheet', onChange);
    source.addEventListener('sheets', onChange);
    return () => source.close();
  }, [client, signedIn]);
}

function refetchFor(client: QueryClient, event: ChangeEvent): void {
  switch (event.kind) {
    case 'member':
      // One's own role may have changed, and with it what each sheet's answer says.
      client.invalidateQueries({ queryKey: keys.me });
      client.invalidateQueries({ queryKey: keys.members(event.teamId) });
      client.invalidateQueries({ queryKey: keys.invitations(event.teamId) });
      client.invalidateQueries({ queryKey: keys.everySheet });
      return;
    case 'sheet':
      client.invalidateQueries({ queryKey: keys.sheets(event.teamId) });
      client.invalidateQueries({ queryKey: keys.sheet(event.sheetId) });
      return;
    case 'sheets':
      client.invalidateQueries({ queryKey: keys.sheets(event.teamId) });
      return;
  }
}
