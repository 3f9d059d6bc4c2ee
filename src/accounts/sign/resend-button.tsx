// Mails the link that proves an address once more.
import { useMutation } from '@tanstack/react-query';
import { resendCheck } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { Button } from '../../ui/button';
import { errorWords } from '../../ui/error-state';
import { sayDone, sayStop } from '../../ui/notices';

export function ResendButton({ full = false }: { readonly full?: boolean }) {
  const resend = useMutation({
    mutationFn: () => call(resendCheck),
    onSuccess: () => sayDone('A new link is on its way'),
    onError: (error) => sayStop(errorWords(error).detail),
  });
  return (
    <Button full={full} busy={resend.isPending} busyWords="Asking for it" onClick={() => resend.mutate()}>
      Mail the link again
    </Button>
  );
}
