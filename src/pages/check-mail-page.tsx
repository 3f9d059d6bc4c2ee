// After signing up: a link is on its way, and what works without it.
import { useSearchParams } from 'react-router-dom';
import { useUser } from '../accounts/session';
import { nextPage } from '../accounts/sign/next-page';
import { ResendButton } from '../accounts/sign/resend-button';
import { SignFrame } from '../accounts/sign/sign-frame';
import { ButtonLink } from '../ui/button';

export function CheckMailPage() {
  const user = useUser();
  const next = useSearchParams()[0].get('next');
  if (!user) return null;
  const onward = (
    <ButtonLink look="go" size="big" full to={nextPage(user, next)}>
      Go on
    </ButtonLink>
  );
  if (user.mailChecked) {
    return (
      <SignFrame title="Your address is checked">
        <p>
          <b className="b">{user.email}</b> is yours. Nothing more to do here.
        </p>
        {onward}
      </SignFrame>
    );
  }
  return (
    <SignFrame title="Check your mail">
      <p>
        A link went to <b className="b">{user.email}</b>. It works once, for 30 minutes. You can look around
        and buy without it; units go on offer only after it.
      </p>
      {onward}
      <ResendButton full />
    </SignFrame>
  );
}
