import { useParams } from 'react-router-dom';
import { NarrowPage } from '../../components/NarrowPage.tsx';
import { ResetPasswordForm } from '../../features/session/components/ResetPasswordForm.tsx';

export function ResetPasswordPage() {
  const { token = '' } = useParams();
  return (
    <NarrowPage title="Choose a new password">
      <ResetPasswordForm token={token} />
    </NarrowPage>
  );
}
