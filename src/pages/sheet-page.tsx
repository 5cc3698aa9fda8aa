import { useCallback, useState } from 'react';
import { useParams } from 'react-router-dom';
import type { SheetAnswer } from '#shared/api/sheets';
import { ApiError } from '../api/client';
import { useSheet } from '../api/sheets';
import type { Denial } from '../live/room';
import { useRoom } from '../live/use-room';
import { Button, ButtonLink } from '../ui/button';
import { DeadEnd } from '../ui/dead-end';
import { useStatus } from '../ui/status';
import { Waiting } from '../ui/waiting';
import { SheetDesk } from './sheet-desk';

/** `/sheets/:id`: the live sheet. */
export default function SheetPage() {
  const { id: sheetId = '' } = useParams();
  const answer = useSheet(sheetId);
  // Once open, a sheet stays: an answer that fails later must not take away what was drawn, and the live line says who may no longer see it.
  if (answer.data) return <LiveSheet key={sheetId} answer={answer.data} refetch={() => void answer.refetch()} />;
  if (answer.isError) return <NotOpened error={answer.error} retry={() => void answer.refetch()} />;
  return <Opening>Opening the sheet</Opening>;
}

function NotOpened({ error, retry }: { error: Error; retry: () => void }) {
  if (error instanceof ApiError && error.status === 404) {
    return (
      <DeadEnd title="No such sheet, or not yours to see">
        <p>Check the address, or ask whoever sent it to invite you to the team it belongs to.</p>
      </DeadEnd>
    );
  }
  return (
    <DeadEnd title="The sheet could not be opened" action={<Button onClick={retry}>Try again</Button>}>
      <p>{error.message}</p>
    </DeadEnd>
  );
}

const DENIAL_WORDS: Readonly<Record<Denial, string>> = {
  'not-allowed':
    'Your last change was not shared: you may only look at this sheet now. It shows what everyone else sees.',
  archived:
    'Your last change was not shared: this sheet was archived, and is to be looked at only. It shows what everyone else sees.',
  'too-large': 'Your last change was too large to share. The sheet shows what everyone else sees: change less at once.',
};

/** The live connection to a sheet; begun anew after the server refused a change, for then the copy here is not the shared one. */
function LiveSheet({ answer, refetch }: { answer: SheetAnswer; refetch: () => void }) {
  const [attempt, setAttempt] = useState(0);
  const { warn } = useStatus();
  const onDenied = useCallback(
    (denial: Denial) => {
      warn(DENIAL_WORDS[denial]);
      setAttempt((before) => before + 1);
      refetch();
    },
    [warn, refetch],
  );
  return <ConnectedSheet key={attempt} answer={answer} onDenied={onDenied} />;
}

function ConnectedSheet({ answer, onDenied }: { answer: SheetAnswer; onDenied: (denial: Denial) => void }) {
  const { room, state } = useRoom(answer.sheet.id, onDenied);
  if (state.kind === 'refused') return <Refused why={state.why} />;
  if (!room || state.kind === 'opening') {
    const unreachable = state.kind === 'opening' && state.unreachable;
    return (
      <Opening>
        {unreachable ? 'The server cannot be reached; trying again. Check the connection.' : 'Opening the sheet'}
      </Opening>
    );
  }
  return <SheetDesk room={room} state={state} answer={answer} />;
}

function Opening({ children }: { children: string }) {
  return (
    <main id="main" className="p-6">
      <Waiting>{children}</Waiting>
    </main>
  );
}

function Refused({ why }: { why: 'signed-out' | 'forbidden' | 'not-found' }) {
  switch (why) {
    case 'signed-out':
      return (
        <DeadEnd
          title="You are signed out"
          action={
            <ButtonLink to="/sign-in" reloadDocument>
              Sign in
            </ButtonLink>
          }
        >
          <p>What you drew until then is saved.</p>
        </DeadEnd>
      );
    case 'forbidden':
      return (
        <DeadEnd title="You may no longer open this sheet">
          <p>You were taken out of its team. Ask one of its owners if that was not meant.</p>
        </DeadEnd>
      );
    case 'not-found':
      return (
        <DeadEnd title="This sheet is no longer there">
          <p>An owner of its team has deleted it.</p>
        </DeadEnd>
      );
  }
}
