// Asks once more before an action that needs no form; where money moves for good it says the exact cents.
import { useState, type ReactNode } from 'react';
import { ConfirmDialog } from '../../ui/dialog';
import { errorWords } from '../../ui/error-state';
import { StopBox } from '../../ui/stop-box';
import { hasMovedOn } from '../api';

interface ConfirmActionProps {
  readonly onClose: () => void;
  readonly title: string;
  readonly description: string;
  readonly confirmWords: string;
  readonly onConfirm: () => Promise<unknown>;
  readonly children?: ReactNode;
}

export function ConfirmAction(props: ConfirmActionProps) {
  const { onClose, title, description, confirmWords, onConfirm, children } = props;
  const [error, setError] = useState<unknown>(null);
  async function confirm() {
    setError(null);
    try {
      await onConfirm();
    } catch (caught) {
      if (hasMovedOn(caught)) return;
      setError(caught);
      // Thrown on so that the dialog stays open with the reason in it.
      throw caught;
    }
  }
  const words = error === null ? null : errorWords(error);
  return (
    <ConfirmDialog
      open
      onClose={onClose}
      title={title}
      description={description}
      confirmWords={confirmWords}
      onConfirm={() => confirm()}
    >
      {words && (
        <StopBox title={words.title} announce>
          <p>{words.detail}</p>
        </StopBox>
      )}
      {children}
    </ConfirmDialog>
  );
}
