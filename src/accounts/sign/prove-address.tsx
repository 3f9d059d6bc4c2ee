// The link that proves a mail address. A press is asked for, because mail scanners open every link they see.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { checkMail } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { Button, ButtonLink } from '../../ui/button';
import { errorWords } from '../../ui/error-state';
import { StopBox } from '../../ui/stop-box';
import { meQuery, useUser } from '../session';
import { nextPage } from './next-page';
import { ResendButton } from './resend-button';

export function ProveAddress({ token }: { readonly token: string }) {
  const client = useQueryClient();
  const user = useUser();
  const prove = useMutation({
    mutationFn: () => call(checkMail, { body: { token } }),
    onSuccess: () => client.invalidateQueries({ queryKey: meQuery.queryKey }),
  });
  if (prove.data) {
    return (
      <>
        <p role="status">
          <b className="b">{prove.data.email}</b> is yours. Units can go on offer now.
        </p>
        <ButtonLink look="go" size="big" full to={user ? nextPage(user, null) : paths.signIn.to()}>
          {user ? 'Go on' : 'Sign in'}
        </ButtonLink>
      </>
    );
  }
  return (
    <>
      {prove.error && (
        <StopBox title="The link does not work" announce>
          <p>{errorWords(prove.error).detail}</p>
        </StopBox>
      )}
      <p>One press, and the address you signed up with is known to be yours.</p>
      <Button
        look="go"
        size="big"
        full
        busy={prove.isPending}
        busyWords="Checking the link"
        onClick={() => prove.mutate()}
      >
        This is my address
      </Button>
      {prove.error && user && !user.mailChecked && <ResendButton full />}
    </>
  );
}
