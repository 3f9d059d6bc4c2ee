// The yard's own note in marker pen, on a tag only: at most eight words, and nothing anybody must act on.
import '@fontsource-variable/shantell-sans/bnce.css';

export function HandNote({ children }: { readonly children: string }) {
  return <p className="hand">{children}</p>;
}
