import { Link } from 'react-router-dom';
import { NarrowPage } from '../../components/NarrowPage.tsx';
import { ForgotPasswordForm } from '../../features/session/components/ForgotPasswordForm.tsx';
import { paths } from '../../lib/paths.ts';

export function ForgotPasswordPage() {
  return (
    <NarrowPage title="Forgot the password">
      <ForgotPasswordForm />
      <p>
        <Link to={paths.signIn} className="prose-link">
          Back to sign-in
        </Link>
      </p>
    </NarrowPage>
  );
}
