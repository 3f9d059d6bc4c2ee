// Words for a reader that the eye already has from the picture.
import type { ReactNode } from 'react';

export function Hidden({ children }: { readonly children: ReactNode }) {
  return <span className="vh">{children}</span>;
}
