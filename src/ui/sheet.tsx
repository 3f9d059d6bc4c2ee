// Paper and frames: a section with its heading, a white sheet, and the one framed panel that matters on a page.
import clsx from 'clsx';
import { useId, type ReactNode } from 'react';

interface HeadingProps {
  readonly title: ReactNode;
  /** Small words or a link on the right. */
  readonly note?: ReactNode;
  readonly level?: 2 | 3;
  readonly id?: string;
}

/** A heading under its 3 px rule. */
export function SectionHead({ title, note, level = 2, id }: HeadingProps) {
  const Heading = level === 2 ? 'h2' : 'h3';
  return (
    <div className="hd">
      <Heading id={id}>{title}</Heading>
      {note && <div className="hd-note">{note}</div>}
    </div>
  );
}

/** A section of a page, 44 px below the one before. */
export function Section({
  children,
  className,
  ...heading
}: HeadingProps & { readonly children: ReactNode; readonly className?: string }) {
  const id = useId();
  return (
    <section className={clsx('section', className)} aria-labelledby={id}>
      <SectionHead {...heading} id={id} />
      {children}
    </section>
  );
}

export function Sheet({
  children,
  pad = false,
  className,
}: {
  readonly children: ReactNode;
  readonly pad?: boolean;
  readonly className?: string;
}) {
  return <div className={clsx('sheet', pad && 'sheet-pad', className)}>{children}</div>;
}

interface PanelProps {
  readonly label: string;
  readonly children: ReactNode;
  readonly className?: string;
}

/** 2 px frame, 5 px top: buy, next, split, grade. One a page. */
export function Panel({ label, children, className }: PanelProps) {
  return (
    <section className={clsx('panel', className)} aria-label={label}>
      {children}
    </section>
  );
}
