// Signing in. Whoever is signed in already is led on at once.
import { Navigate, useSearchParams } from 'react-router-dom';
import { useUser } from '../accounts/session';
import { nextPage } from '../accounts/sign/next-page';
import { SignFrame } from '../accounts/sign/sign-frame';
import { SignInForm } from '../accounts/sign/sign-in-form';
import { paths } from '../paths';
import { ButtonLink } from '../ui/button';

export function SignInPage() {
  const user = useUser();
  const next = useSearchParams()[0].get('next');
  if (user) return <Navigate to={nextPage(user, next)} replace />;
  return (
    <SignFrame
      title="Sign in"
      other={
        <div className="grid gap-14">
          <p className="b">New here?</p>
          <ButtonLink full to={paths.signUp.to({ next })}>
            Make an account
          </ButtonLink>
        </div>
      }
    >
      <SignInForm next={next} />
    </SignFrame>
  );
}
