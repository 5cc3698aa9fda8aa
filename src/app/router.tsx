import { lazy, Suspense } from 'react';
import { Route, Routes, useLocation } from 'react-router-dom';
import { InvitePage } from '../pages/invite-page';
import { NotFoundPage } from '../pages/not-found-page';
import { SheetsPage } from '../pages/sheets-page';
import { SignInPage } from '../pages/sign-in-page';
import { SignUpPage } from '../pages/sign-up-page';
import { TeamPage } from '../pages/team-page';
import { Waiting } from '../ui/waiting';
import { ErrorBoundary } from './error-boundary';
import { SignedIn } from './signed-in';

// The drawing and the solver are most of the program, and none of it is needed to sign in.
const SheetPage = lazy(() => import('../pages/sheet-page'));

/** Every address and its page. */
export function Router() {
  const { pathname } = useLocation();
  return (
    <ErrorBoundary page={pathname}>
      <Suspense
        fallback={
          <main className="p-6">
            <Waiting>Fetching the page</Waiting>
          </main>
        }
      >
        <Routes>
          <Route path="/sign-in" element={<SignInPage />} />
          <Route path="/sign-up" element={<SignUpPage />} />
          <Route path="/invite/:token" element={<InvitePage />} />
          <Route element={<SignedIn />}>
            <Route path="/" element={<SheetsPage />} />
            <Route path="/team" element={<TeamPage />} />
            <Route path="/sheets/:id" element={<SheetPage />} />
          </Route>
          <Route path="*" element={<NotFoundPage />} />
        </Routes>
      </Suspense>
    </ErrorBoundary>
  );
}
