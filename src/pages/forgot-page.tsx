// Getting a link to set a new password.
import { useSearchParams } from 'react-router-dom';
import { ForgotForm } from '../accounts/sign/forgot-form';
import { SignFrame } from '../accounts/sign/sign-frame';

export function ForgotPage() {
  const next = useSearchParams()[0].get('next');
  return (
    <SignFrame title="Get a link">
      <p>We mail you a link that lets you set a new password.</p>
      <ForgotForm next={next} />
    </SignFrame>
  );
}
