import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import type { InvitationLookUp } from '#shared/api/invitations';
import { ApiError } from '../api/client';
import { useAcceptInvitation, useInvitation } from '../api/invitations';
import { useMe, useSignOut } from '../api/session';
import { CurveFamily } from '../features/sign-in/curve-family';
import { SignInForm } from '../features/sign-in/sign-in-form';
import { SignUpForm } from '../features/sign-in/sign-up-form';
import { Button, ButtonLink } from '../ui/button';
import { EntryFrame } from '../ui/entry-frame';
import { Failure } from '../ui/notice';
import { PageTitle } from '../ui/page-title';
import { TextLink } from '../ui/text-link';
import { Waiting } from '../ui/waiting';
import { When } from '../ui/when';

/** Where an invitation link leads: what one is asked, and the way in for whoever holds it. */
export function InvitePage() {
  const { token = '' } = useParams();
  const invitation = useInvitation(token);
  return (
    <EntryFrame figure={<CurveFamily />}>
      <PageTitle className="mb-4 text-xl">Invitation</PageTitle>
      {invitation.isPending && <Waiting>Looking up the invitation</Waiting>}
      {invitation.isError && <NotValid error={invitation.error} onRetry={() => invitation.refetch()} />}
      {invitation.isSuccess && <Asked token={token} invitation={invitation.data} />}
    </EntryFrame>
  );
}

function NotValid({ error, onRetry }: { readonly error: Error; readonly onRetry: () => void }) {
  const final = error instanceof ApiError && error.status >= 400 && error.status < 500 && error.status !== 429;
  return (
    <>
      {final ? <Failure>{error.message}</Failure> : <Failure onRetry={onRetry}>{error.message}</Failure>}
      {final && (
        <p className="mt-4">
          A link works once and for seven days. An owner of the team can make a new one on the team’s page.
        </p>
      )}
      <ButtonLink to="/" className="mt-6">
        To your sheets
      </ButtonLink>
    </>
  );
}

function Asked({ token, invitation }: { readonly token: string; readonly invitation: InvitationLookUp }) {
  const me = useMe();
  const navigate = useNavigate();
  // Here, not in the parts below: signing in changes the part, and what became of joining must outlive that.
  const accept = useAcceptInvitation();
  const join = () => accept.mutate(token, { onSuccess: (team) => navigate(`/?team=${team.id}`, { replace: true }) });
  const { team, role, invitedBy, email, expiresAt } = invitation;
  return (
    <>
      <p className="mb-6 break-words">
        {invitedBy} asks you to join <strong>{team}</strong> as {role === 'owner' ? 'an' : 'a'} {role}.{' '}
        <span className="text-faint">
          Good until <When at={expiresAt} />.
        </span>
      </p>
      {accept.isError && (
        <div className="mb-6">
          <Failure>
            {accept.error.message} <TextLink to="/">To your sheets</TextLink>
          </Failure>
        </div>
      )}
      {me.isPending && <Waiting>Looking up who you are</Waiting>}
      {me.isError && <Failure onRetry={() => me.refetch()}>{me.error.message}</Failure>}
      {me.data === null && <Newcomer token={token} email={email ?? undefined} onSignedIn={join} />}
      {me.data && <Known person={me.data.person} onlyFor={email} joining={accept.isPending} onJoin={join} />}
    </>
  );
}

interface NewcomerProps {
  readonly token: string;
  readonly email: string | undefined;
  readonly onSignedIn: () => void;
}

/** Someone who is not signed in: an account now, or the one they have. */
function Newcomer({ token, email, onSignedIn }: NewcomerProps) {
  const navigate = useNavigate();
  const [has, setHas] = useState(false);
  return (
    <>
      {has ? (
        <SignInForm email={email} onSignedIn={onSignedIn} />
      ) : (
        <SignUpForm invitation={token} email={email} onSignedUp={() => navigate('/', { replace: true })} />
      )}
      <p className="mt-8 border-t border-rule pt-4">
        {has ? 'No account yet?' : 'Have an account?'}{' '}
        <Button look="quiet" onClick={() => setHas(!has)}>
          {has ? 'Make one' : 'Sign in and join'}
        </Button>
      </p>
    </>
  );
}

interface KnownProps {
  readonly person: { readonly name: string; readonly email: string };
  readonly onlyFor: string | null;
  readonly joining: boolean;
  readonly onJoin: () => void;
}

/** Someone who is signed in already, perhaps as another than the one who was asked. */
function Known({ person, onlyFor, joining, onJoin }: KnownProps) {
  const signOut = useSignOut(window.location.pathname);
  const forAnother = onlyFor !== null && onlyFor !== person.email;
  return (
    <>
      {signOut.isError && (
        <div className="mb-4">
          <Failure>{signOut.error.message}</Failure>
        </div>
      )}
      {forAnother ? (
        <p className="mb-6 break-words">
          It is for {onlyFor}, but you are signed in as {person.email}. Sign out, then open it as {onlyFor}.
        </p>
      ) : (
        <Button look="strong" className="mb-4 min-h-10 w-full min-w-0" busy={joining} onClick={onJoin}>
          <span className="truncate">Join as {person.name}</span>
        </Button>
      )}
      <Button look={forAnother ? 'plain' : 'quiet'} busy={signOut.isPending} onClick={() => signOut.mutate()}>
        {forAnother ? 'Sign out' : 'Not you? Sign out'}
      </Button>
    </>
  );
}
