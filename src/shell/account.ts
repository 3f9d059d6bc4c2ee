// What the frame of the page needs to know about the person signed in.

export interface ShellAccount {
  readonly name: string;
  readonly email: string;
  /** Under the name: "Quenby Dismantlers" for a member, "Admin", or nothing. */
  readonly role?: string;
  readonly isAdmin: boolean;
  readonly isMember: boolean;
  readonly onSignOut: () => void;
}

export interface MenuLink {
  readonly label: string;
  readonly to: string;
}
