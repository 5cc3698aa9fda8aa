import { Navigate, useSearchParams } from 'react-router-dom';
import { useMe } from '../api/session';
import { CurveFamily } from '../features/sign-in/curve-family';
import { SignInForm } from '../features/sign-in/sign-in-form';
import { wayOn } from '../features/sign-in/way-on';
import { EntryFrame } from '../ui/entry-frame';
import { PageTitle } from '../ui/page-title';
import { TextLink } from '../ui/text-link';

export function SignInPage() {
  const me = useMe();
  const [search] = useSearchParams();
  if (me.data) return <Navigate to={wayOn(search)} replace />;
  return (
    <EntryFrame figure={<CurveFamily />}>
      <PageTitle className="mb-6 text-xl">Sign in</PageTitle>
      <SignInForm />
      <p className="mt-8 border-t border-rule pt-4">
        New here? <TextLink to={{ pathname: '/sign-up', search: search.toString() }}>Make an account</TextLink>
      </p>
    </EntryFrame>
  );
}
