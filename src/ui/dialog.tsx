// Dialogs: a framed sheet over a held page. Focus goes in, stays in, and comes back; Escape closes.
import { X } from 'lucide-react';
import { AlertDialog, Dialog as RadixDialog } from 'radix-ui';
import { useState, type ReactNode } from 'react';
import { Button } from './button';
import { Icon } from './icon';
import { useReturnFocus } from './use-return-focus';

interface DialogProps {
  readonly open: boolean;
  readonly onClose: () => void;
  readonly title: string;
  readonly description?: string;
  readonly children?: ReactNode;
  /** Buttons at the foot: the red or black one first. */
  readonly actions?: ReactNode;
}

/*
 * Radix's own overlay puts a style element into the page to stop it scrolling, which the page's policy forbids; the
 * backdrop here is ours, and base.css holds the page while `data-holds-page` is there.
 */
export function Dialog({ open, onClose, title, description, children, actions }: DialogProps) {
  const returnFocus = useReturnFocus();
  return (
    <RadixDialog.Root open={open} onOpenChange={(next) => !next && onClose()}>
      <RadixDialog.Portal>
        <div className="dialog-back" data-holds-page aria-hidden="true" />
        <RadixDialog.Content
          className="dialog"
          {...returnFocus}
          {...(description ? {} : { 'aria-describedby': undefined })}
        >
          <div className="dialog-head">
            <RadixDialog.Title>{title}</RadixDialog.Title>
            <RadixDialog.Close className="dialog-close" aria-label="Close">
              <Icon of={X} />
            </RadixDialog.Close>
          </div>
          {description && <RadixDialog.Description>{description}</RadixDialog.Description>}
          {children}
          {actions && <div className="dialog-actions">{actions}</div>}
        </RadixDialog.Content>
      </RadixDialog.Portal>
    </RadixDialog.Root>
  );
}

interface ConfirmDialogProps {
  readonly open: boolean;
  readonly onClose: () => void;
  /** "Release $530.00 to Wren Bros?" */
  readonly title: string;
  /** What happens, and that it cannot be called back where that is so. */
  readonly description: string;
  /** The button says what it does and how much: "Grade B, release $530.00". */
  readonly confirmWords: string;
  readonly cancelWords?: string;
  /** Closes the dialog when done; when it throws, the dialog stays and the caller says why. */
  readonly onConfirm: () => Promise<void> | void;
  readonly children?: ReactNode;
}

/** Asks once more before something that cannot be undone. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  const {
    open,
    onClose,
    title,
    description,
    confirmWords,
    cancelWords = 'Go back',
    onConfirm,
    children,
  } = props;
  const [busy, setBusy] = useState(false);
  const returnFocus = useReturnFocus();
  async function confirm() {
    setBusy(true);
    try {
      await onConfirm();
      onClose();
    } catch {
      // The dialog stays open, and the caller shows why.
    } finally {
      setBusy(false);
    }
  }
  return (
    <AlertDialog.Root open={open} onOpenChange={(next) => !next && !busy && onClose()}>
      <AlertDialog.Portal>
        <div className="dialog-back" data-holds-page aria-hidden="true" />
        <AlertDialog.Content className="dialog" aria-modal="true" {...returnFocus}>
          <AlertDialog.Title>{title}</AlertDialog.Title>
          <AlertDialog.Description>{description}</AlertDialog.Description>
          {children}
          <div className="dialog-actions">
            <Button look="go" size="big" busy={busy} busyWords="Working" onClick={() => void confirm()}>
              {confirmWords}
            </Button>
            <AlertDialog.Cancel asChild>
              <Button size="big" disabled={busy}>
                {cancelWords}
              </Button>
            </AlertDialog.Cancel>
          </div>
        </AlertDialog.Content>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  );
}
