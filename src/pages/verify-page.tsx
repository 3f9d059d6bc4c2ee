// Opened from the mail that checks an address.
import { useParams } from 'react-router-dom';
import { ProveAddress } from '../accounts/sign/prove-address';
import { SignFrame } from '../accounts/sign/sign-frame';

export function VerifyPage() {
  const { token = '' } = useParams();
  return (
    <SignFrame title="Check this address">
      <ProveAddress token={token} />
    </SignFrame>
  );
}
