// Letters about an account: links to prove an address, set a password, join a team.
import type { Letter } from './letter';

/** What each account letter needs to know. */
export type AccountMail =
  | { readonly template: 'check_mail'; readonly data: { readonly name: string; readonly link: string } }
  | { readonly template: 'reset_password'; readonly data: { readonly name: string; readonly link: string } }
  | { readonly template: 'password_changed'; readonly data: { readonly name: string } }
  | {
      readonly template: 'team_invite';
      readonly data: { readonly sellerName: string; readonly inviterName: string; readonly link: string };
    };

const SHORT_LIVED = 'The link works once, for 30 minutes. If you did not ask for it, do nothing.';

export function accountLetter(mail: AccountMail): Letter {
  switch (mail.template) {
    case 'check_mail':
      return {
        subject: 'Check your mail address',
        lines: [
          `${mail.data.name}, this link proves that the address is yours. Units can be put on sale after that.`,
        ],
        link: { label: 'This is my address', url: mail.data.link },
        foot: SHORT_LIVED,
      };
    case 'reset_password':
      return {
        subject: 'Set a new password',
        lines: [`${mail.data.name}, somebody asked to set a new password for your account.`],
        link: { label: 'Set a new password', url: mail.data.link },
        foot: SHORT_LIVED,
      };
    case 'password_changed':
      return {
        subject: 'Your password was changed',
        lines: [
          `${mail.data.name}, the password of your account was changed and every other session was signed out.`,
          'If that was not you, set a new password now from the sign-in page.',
        ],
      };
    case 'team_invite':
      return {
        subject: `Join ${mail.data.sellerName} on Spragyard`,
        lines: [`${mail.data.inviterName} invites you to work for ${mail.data.sellerName} on Spragyard.`],
        link: { label: `Join ${mail.data.sellerName}`, url: mail.data.link },
        foot: 'The link works once, for 7 days.',
      };
  }
}
