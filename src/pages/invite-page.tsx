// Opened from the mail that invites somebody to work for a seller.
import { useParams } from 'react-router-dom';
import { useUser } from '../accounts/session';
import { JoinTeam } from '../accounts/sign/join-team';
import { SignFrame } from '../accounts/sign/sign-frame';

export function InvitePage() {
  const { token = '' } = useParams();
  const user = useUser();
  if (!user) return null;
  return (
    <SignFrame title="Join a team">
      <JoinTeam token={token} user={user} />
    </SignFrame>
  );
}
