// Opened from the mail that lets somebody set a new password.
import { useParams } from 'react-router-dom';
import { ResetForm } from '../accounts/sign/reset-form';
import { SignFrame } from '../accounts/sign/sign-frame';
import { paths } from '../paths';
import { ButtonLink } from '../ui/button';

export function ResetPage() {
  const { token = '' } = useParams();
  return (
    <SignFrame
      title="Set a new password"
      other={
        <div className="grid gap-14">
          <p className="b">Link used or too old?</p>
          <ButtonLink full to={paths.forgot.to()}>
            Email me a new one
          </ButtonLink>
        </div>
      }
    >
      <ResetForm token={token} />
    </SignFrame>
  );
}
