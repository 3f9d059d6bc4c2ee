// The whole menu as a sheet from the right, for phones and narrow windows.
import { LogOut, Menu, X } from 'lucide-react';
import { Dialog } from 'radix-ui';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Icon } from '../ui/icon';
import { ThemeSwitch } from '../ui/theme-switch';
import type { MenuLink, ShellAccount } from './account';
import type { NavCell } from './nav';

interface PhoneMenuProps {
  readonly cells: readonly NavCell[];
  readonly links: readonly MenuLink[];
  readonly account: ShellAccount | null;
}

export function PhoneMenu({ cells, links, account }: PhoneMenuProps) {
  const [open, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <Dialog.Root open={open} onOpenChange={setOpen}>
      <Dialog.Trigger className="bar-cell bar-menu-button" aria-label="Menu">
        <Icon of={Menu} />
      </Dialog.Trigger>
      <Dialog.Portal>
        <div className="dialog-back" data-holds-page aria-hidden="true" />
        <Dialog.Content className="phone-menu" aria-describedby={undefined}>
          <div className="menu-who dialog-head">
            <div>
              <Dialog.Title className="text-h3">{account ? account.name : 'Menu'}</Dialog.Title>
              {account && <span className="sm mute">{account.email}</span>}
            </div>
            <Dialog.Close className="dialog-close" aria-label="Close menu">
              <Icon of={X} />
            </Dialog.Close>
          </div>
          <nav aria-label="Main">
            {cells.map((cell) => (
              <Link
                key={cell.to}
                className="menu-item"
                to={cell.to}
                aria-current={cell.current ? 'page' : undefined}
                onClick={close}
              >
                {cell.label}
                {cell.count > 0 && <span className="bar-count">{cell.count}</span>}
              </Link>
            ))}
          </nav>
          <nav aria-label="Account">
            {links.map((link) => (
              <Link key={link.to} className="menu-item" to={link.to} onClick={close}>
                {link.label}
              </Link>
            ))}
          </nav>
          {account && (
            <button type="button" className="menu-item" onClick={account.onSignOut}>
              <Icon of={LogOut} />
              Sign out
            </button>
          )}
          <div className="menu-foot">
            <ThemeSwitch />
          </div>
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}
