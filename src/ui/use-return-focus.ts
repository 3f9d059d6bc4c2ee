// A dialog opened by state has no trigger of its own to give focus back to, so the place it came from is remembered.
import { useRef } from 'react';

interface ReturnFocus {
  readonly onOpenAutoFocus: () => void;
  readonly onCloseAutoFocus: (event: Event) => void;
}

/** Spread onto a dialog's content. */
export function useReturnFocus(): ReturnFocus {
  const from = useRef<Element | null>(null);
  return {
    onOpenAutoFocus: () => {
      from.current = document.activeElement;
    },
    onCloseAutoFocus: (event) => {
      event.preventDefault();
      if (from.current instanceof HTMLElement) from.current.focus();
    },
  };
}
