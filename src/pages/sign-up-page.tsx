// Making an account.
import { Navigate, useSearchParams } from 'react-router-dom';
import { useUser } from '../accounts/session';
import { nextPage } from '../accounts/sign/next-page';
import { SignFrame } from '../accounts/sign/sign-frame';
import { SignUpForm } from '../accounts/sign/sign-up-form';
import { paths } from '../paths';
import { ButtonLink } from '../ui/button';

export function SignUpPage() {
  const user = useUser();
  const next = useSearchParams()[0].get('next');
  if (user) {
    const to = user.mailChecked ? nextPage(user, next) : paths.checkMail.to({ next });
    return <Navigate to={to} replace />;
  }
  return (
    <SignFrame
      title="Make an account"
      other={
        <div className="grid gap-14">
          <p className="b">Have one already?</p>
          <ButtonLink full to={paths.signIn.to({ next })}>
            Sign in
          </ButtonLink>
        </div>
      }
    >
      <SignUpForm next={next} />
    </SignFrame>
  );
}
