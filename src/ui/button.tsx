// Buttons say what happens and how much. One red one a screen: it moves things on.
import clsx from 'clsx';
import type { LucideIcon } from 'lucide-react';
import type { ComponentProps } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { Icon } from './icon';

export interface ButtonLook {
  /** `go` is the red one with the cut corner, `ink` is filled black, `plain` is a frame, `reversed` is a frame on a black block. */
  readonly look?: 'plain' | 'go' | 'ink' | 'reversed';
  /** 44, 48, 60 and 76 px high; `yard` is for gloves. */
  readonly size?: 'small' | 'normal' | 'big' | 'yard';
  readonly full?: boolean;
  readonly icon?: LucideIcon;
  /** An arrow or the like behind the words. */
  readonly iconAfter?: LucideIcon;
}

export const buttonClass = (
  { look = 'plain', size = 'normal', full = false }: ButtonLook,
  className?: string,
): string =>
  clsx(
    'btn',
    look !== 'plain' && `btn-${look}`,
    size !== 'normal' && `btn-${size}`,
    full && 'btn-full',
    className,
  );

type ButtonProps = ButtonLook &
  ComponentProps<'button'> & {
    /** Keeps the button in place and refuses a second press while the work is on its way. */
    readonly busy?: boolean;
    /** What the button says meanwhile. */
    readonly busyWords?: string;
  };

export function Button({
  look,
  size,
  full,
  icon,
  iconAfter,
  busy = false,
  busyWords,
  className,
  children,
  type = 'button',
  onClick,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      className={buttonClass({ look, size, full }, className)}
      aria-busy={busy || undefined}
      onClick={(event) => {
        if (busy) event.preventDefault();
        else onClick?.(event);
      }}
    >
      {icon && <Icon of={icon} />}
      {busy && busyWords ? busyWords : children}
      {iconAfter && <Icon of={iconAfter} />}
    </button>
  );
}

/** A link inside the product that looks like a button. */
export function ButtonLink({
  look,
  size,
  full,
  icon,
  iconAfter,
  className,
  children,
  ...rest
}: ButtonLook & LinkProps) {
  return (
    <Link {...rest} className={buttonClass({ look, size, full }, className)}>
      {icon && <Icon of={icon} />}
      {children}
      {iconAfter && <Icon of={iconAfter} />}
    </Link>
  );
}

/** A link out of the page (a PDF, the hosted checkout) that looks like a button. */
export function ButtonAnchor({
  look,
  size,
  full,
  icon,
  iconAfter,
  className,
  children,
  ...rest
}: ButtonLook & ComponentProps<'a'>) {
  return (
    <a {...rest} className={buttonClass({ look, size, full }, className)}>
      {icon && <Icon of={icon} />}
      {children}
      {iconAfter && <Icon of={iconAfter} />}
    </a>
  );
}
