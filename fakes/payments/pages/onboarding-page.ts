// The hosted page on which a seller completes a connected account, with one button.
import { escapeHtml, page } from '../../page';
import type { Account, AccountLink } from '../model/balance';
import { BANNER } from './checkout-page';

const ONBOARDING_BANNER = BANNER.replace('no real card is charged', 'no real account is opened');

export const onboardingPage = (link: AccountLink, account: Account): string =>
  page(
    'Set up payouts',
    ONBOARDING_BANNER,
    `<h1>Set up payouts</h1>
<div class="card">
<p>On the real page you would give your name, your tax number and a bank account. Here one button stands for all of it.</p>
<dl>
<dt>Account</dt><dd><code>${escapeHtml(account.id)}</code></dd>
${account.email ? `<dt>E-mail</dt><dd>${escapeHtml(account.email)}</dd>` : ''}
<dt>Country</dt><dd>${escapeHtml(account.country)}</dd>
<dt>State</dt><dd>${account.payouts_enabled ? 'complete: payouts are on' : 'not complete: payouts are off'}</dd>
</dl>
</div>
<form class="foot" method="post" action="/onboard/${escapeHtml(link.id)}">
<button class="wide" type="submit">Complete the account</button>
</form>
<p class="foot"><a href="${escapeHtml(link.returnUrl)}">Not now, go back</a></p>`,
  );

export const expiredLinkPage = (refreshUrl: string): string =>
  page(
    'This link has expired',
    ONBOARDING_BANNER,
    `<h1>This link has expired</h1>
<div class="notice bad" role="status"><p>Account links last five minutes. Ask for a new one.</p></div>
<p><a class="button" href="${escapeHtml(refreshUrl)}">Get a new link</a></p>`,
  );
