// An icon beside a word: 2 px, square caps, mitre joins. Where it stands alone its button carries the label.
import type { LucideIcon } from 'lucide-react';

export function Icon({ of: Drawn, size = 20 }: { readonly of: LucideIcon; readonly size?: number }) {
  return (
    <Drawn
      className="i"
      style={{ width: size, height: size }}
      strokeWidth={2}
      strokeLinecap="square"
      strokeLinejoin="miter"
      aria-hidden="true"
    />
  );
}
