// Joining a seller account with the link that was mailed.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { acceptInvite } from '../../../shared/accounts/seller-contract';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { Button, ButtonLink } from '../../ui/button';
import { errorWords } from '../../ui/error-state';
import { StopBox } from '../../ui/stop-box';
import { meQuery, type SignedIn } from '../session';

export function JoinTeam({ token, user }: { readonly token: string; readonly user: SignedIn }) {
  const client = useQueryClient();
  const join = useMutation({
    mutationFn: () => call(acceptInvite, { body: { token } }),
    onSuccess: () => client.invalidateQueries({ queryKey: meQuery.queryKey }),
  });
  if (join.data) {
    return (
      <>
        <p role="status">
          You work for <b className="b">{join.data.sellerName}</b> now.
        </p>
        <ButtonLink look="go" size="big" full to={paths.yard.to()}>
          Go to the yard desk
        </ButtonLink>
      </>
    );
  }
  return (
    <>
      {join.error && (
        <StopBox title="You did not join" announce>
          <p>{errorWords(join.error).detail}</p>
        </StopBox>
      )}
      <p>
        You are signed in as <b className="b">{user.email}</b>. The invitation counts for the address it went
        to.
      </p>
      <Button
        look="go"
        size="big"
        full
        busy={join.isPending}
        busyWords="Joining"
        onClick={() => join.mutate()}
      >
        Join the team
      </Button>
    </>
  );
}
