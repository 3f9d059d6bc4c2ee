// A bar that stays at the foot of phones and tablets, as the last thing on the page: the sum with the one red button, or a list's tools.
import type { ReactNode } from 'react';

export function BottomBar({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <section className="bottom-bar" aria-label={label}>
      {children}
    </section>
  );
}
