import { Navigate, useSearchParams } from 'react-router-dom';
import { useMe } from '../api/session';
import { CurveFamily } from '../features/sign-in/curve-family';
import { SignUpForm } from '../features/sign-in/sign-up-form';
import { wayOn } from '../features/sign-in/way-on';
import { EntryFrame } from '../ui/entry-frame';
import { PageTitle } from '../ui/page-title';
import { TextLink } from '../ui/text-link';

export function SignUpPage() {
  const me = useMe();
  const [search] = useSearchParams();
  if (me.data) return <Navigate to={wayOn(search)} replace />;
  return (
    <EntryFrame figure={<CurveFamily />}>
      <PageTitle className="mb-2 text-xl">Make an account</PageTitle>
      <p className="mb-6 text-faint">
        You get a team of your own. To join one that is there already, open the invitation link you were sent.
      </p>
      <SignUpForm />
      <p className="mt-8 border-t border-rule pt-4">
        Have an account? <TextLink to={{ pathname: '/sign-in', search: search.toString() }}>Sign in</TextLink>
      </p>
    </EntryFrame>
  );
}
