import { Link, Navigate, useLocation, useNavigate } from 'react-router-dom';
import { NarrowPage } from '../../components/NarrowPage.tsx';
import { DemoSignIns } from '../../features/session/components/DemoSignIns.tsx';
import { SignInForm } from '../../features/session/components/SignInForm.tsx';
import { useReturnPath } from '../../features/session/hooks/useReturnPath.ts';
import { useSession } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';

export function SignInPage() {
  const navigate = useNavigate();
  const { search } = useLocation();
  const back = useReturnPath();
  const onSignedIn = () => void navigate(back, { replace: true });
  if (useSession()) return <Navigate to={back} replace />;
  return (
    <NarrowPage title="Sign in">
      <p className="-mt-2 text-muted">
        What will the detector see? Describe a magnetic film stack, read its Kerr angles, share the answer as
        a link.
      </p>
      <SignInForm onSignedIn={onSignedIn} />
      <p className="flex flex-wrap justify-between gap-3">
        <Link to={paths.forgotPassword} className="prose-link">
          Forgot the password?
        </Link>
        <Link to={paths.signUp + search} className="prose-link">
          Make an account
        </Link>
      </p>
      <DemoSignIns onSignedIn={onSignedIn} />
    </NarrowPage>
  );
}
