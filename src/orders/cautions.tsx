// What can hurt somebody, said beside the action in which it can.
import { TriangleAlert } from 'lucide-react';
import { Icon } from '../ui/icon';

export function Cautions({ lines }: { readonly lines: readonly string[] }) {
  if (lines.length === 0) return null;
  return (
    <aside className="caution" aria-label="Cautions">
      <Icon of={TriangleAlert} />
      <ul>
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </aside>
  );
}
