import { Link, Navigate, useLocation, useNavigate } from 'react-router-dom';
import { NarrowPage } from '../../components/NarrowPage.tsx';
import { SignUpForm } from '../../features/session/components/SignUpForm.tsx';
import { useReturnPath } from '../../features/session/hooks/useReturnPath.ts';
import { useSession } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';

export function SignUpPage() {
  const navigate = useNavigate();
  const { search } = useLocation();
  const back = useReturnPath();
  if (useSession()) return <Navigate to={back} replace />;
  return (
    <NarrowPage title="Make an account">
      <p className="-mt-2 text-muted">
        You get a personal group at once; owners of other groups can add you by e-mail.
      </p>
      <SignUpForm onSignedIn={() => void navigate(back, { replace: true })} />
      <p>
        Already have one?{' '}
        <Link to={paths.signIn + search} className="prose-link">
          Sign in
        </Link>
      </p>
    </NarrowPage>
  );
}
