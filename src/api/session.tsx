import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { createContext, type ReactNode, useContext } from 'react';
import { type MeAnswer, meAnswer, personAnswer, type SignInBody, type SignUpBody } from '#shared/api/accounts';
import { ApiError, call, callForNothing } from './client';
import { keys } from './keys';

/** Who is signed in, with their teams; null when nobody is. */
export function useMe() {
  return useQuery({ queryKey: keys.me, queryFn: fetchMe, staleTime: 60_000 });
}

async function fetchMe(): Promise<MeAnswer | null> {
  try {
    return await call('GET', '/api/me', meAnswer);
  } catch (error) {
    if (error instanceof ApiError && error.status === 401) return null;
    throw error;
  }
}

export function useSignIn() {
  const refresh = useRefreshMe();
  return useMutation({
    mutationFn: (body: SignInBody) => call('POST', '/api/sign-in', personAnswer, body),
    onSuccess: refresh,
  });
}

export function useSignUp() {
  const refresh = useRefreshMe();
  return useMutation({
    mutationFn: (body: SignUpBody) => call('POST', '/api/sign-up', personAnswer, body),
    onSuccess: refresh,
  });
}

/** Signs out and goes to `then`, a path of ours. */
export function useSignOut(then = '/sign-in') {
  return useMutation({
    mutationFn: () => callForNothing('POST', '/api/sign-out', {}),
    // A fresh page load leaves nothing of this person in memory: no query, no open sheet, no undo stack.
    onSuccess: () => window.location.assign(then),
  });
}

function useRefreshMe() {
  const client = useQueryClient();
  return () => client.fetchQuery({ queryKey: keys.me, queryFn: fetchMe, staleTime: 0 });
}

const SessionContext = createContext<MeAnswer | null>(null);

/** Put around every page that only a signed-in person sees. */
export function SessionProvider({ me, children }: { readonly me: MeAnswer; readonly children: ReactNode }) {
  return <SessionContext value={me}>{children}</SessionContext>;
}

/** The signed-in person and their teams, inside `SessionProvider`. */
export function useSession(): MeAnswer {
  const me = useContext(SessionContext);
  if (me === null) throw new Error('useSession is called outside the pages of a signed-in person');
  return me;
}
