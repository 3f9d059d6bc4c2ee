// Who is signed in: their desks, their account, the colours, and the way out.
import { ChevronDown, LogOut } from 'lucide-react';
import { DropdownMenu } from 'radix-ui';
import { Link } from 'react-router-dom';
import { Icon } from '../ui/icon';
import type { MenuLink, ShellAccount } from './account';

interface AccountMenuProps {
  readonly account: ShellAccount;
  readonly links: readonly MenuLink[];
}

export function AccountMenu({ account, links }: AccountMenuProps) {
  return (
    // Not modal: holding the page still would put a style element into it, which its policy forbids.
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger className="bar-cell bar-wide">
        <span>
          <span className="vh">Account menu, </span>
          {account.name}
          {account.role && <small>{account.role}</small>}
        </span>
        <Icon of={ChevronDown} />
      </DropdownMenu.Trigger>
      {/* Drawn in its place, so that it stays inside the header's landmark. */}
      <DropdownMenu.Content className="menu" align="end" sideOffset={5} collisionPadding={8}>
        <DropdownMenu.Label className="menu-who">
          <b className="b">{account.name}</b>
          <span className="sm mute block">{account.email}</span>
        </DropdownMenu.Label>
        {links.map((link) => (
          <DropdownMenu.Item key={link.to} asChild>
            <Link className="menu-item" to={link.to}>
              {link.label}
            </Link>
          </DropdownMenu.Item>
        ))}
        <DropdownMenu.Item className="menu-item" onSelect={account.onSignOut}>
          <Icon of={LogOut} />
          Sign out
        </DropdownMenu.Item>
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
