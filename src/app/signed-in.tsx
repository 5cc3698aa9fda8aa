import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { SessionProvider, useMe } from '../api/session';
import { Button } from '../ui/button';
import { DeadEnd } from '../ui/dead-end';
import { Waiting } from '../ui/waiting';
import { useServerEvents } from './server-events';

/** Lets the pages inside be seen by a signed-in person only; others sign in first and come back. */
export function SignedIn() {
  const me = useMe();
  const { pathname, search } = useLocation();
  useServerEvents(me.data != null);
  if (me.data) {
    return (
      <SessionProvider me={me.data}>
        <Outlet />
      </SessionProvider>
    );
  }
  if (me.isPending) {
    return (
      <main className="p-6">
        <Waiting>Looking up who you are</Waiting>
      </main>
    );
  }
  if (me.isError) {
    return (
      <DeadEnd title="The server does not answer" action={<Button onClick={() => me.refetch()}>Try again</Button>}>
        <p>{me.error.message}</p>
      </DeadEnd>
    );
  }
  const then = pathname + search;
  return <Navigate to={then === '/' ? '/sign-in' : `/sign-in?then=${encodeURIComponent(then)}`} replace />;
}
