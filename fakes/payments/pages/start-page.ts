// The stand-in's own start page: the last sessions and the accounts, for whoever looks around in the demo.
import { dollars, escapeHtml, page } from '../../page';
import { platformBalance, type World } from '../world';
import { BANNER } from './checkout-page';

const SHOWN = 25;

const row = (cells: readonly string[]): string =>
  `<tr>${cells.map((cell) => `<td>${cell}</td>`).join('')}</tr>`;

const table = (heads: readonly string[], rows: readonly string[]): string =>
  rows.length === 0
    ? '<p class="soft">None yet.</p>'
    : `<table><thead><tr>${heads.map((head) => `<th scope="col">${head}</th>`).join('')}</tr></thead><tbody>${rows.join('\n')}</tbody></table>`;

export function startPage(world: World): string {
  const { available, pending } = platformBalance(world, 'usd');
  const sessions = world.state.sessions.all().slice(-SHOWN).reverse();
  const accounts = world.state.accounts.all().slice(-SHOWN).reverse();
  return page(
    'Payments stand-in',
    BANNER,
    `<h1>Payments stand-in</h1>
<p>Speaks the payment provider's API for development and tests. Balance: <strong>${dollars(available)}</strong> available, ${dollars(pending)} on the way. Everything it holds: <a href="/_state">/_state</a>.</p>
<section class="card" aria-labelledby="sessions"><h2 id="sessions">Checkout pages</h2>
${table(
  ['Page', 'Total', 'State'],
  sessions.map((session) =>
    row([
      `<a href="/pay/${escapeHtml(session.id)}">${escapeHtml(session.client_reference_id ?? session.id)}</a>`,
      dollars(session.amount_total, session.currency),
      session.status,
    ]),
  ),
)}
</section>
<section class="card" aria-labelledby="accounts"><h2 id="accounts">Connected accounts</h2>
${table(
  ['Account', 'E-mail', 'Payouts'],
  accounts.map((account) =>
    row([escapeHtml(account.id), escapeHtml(account.email ?? ''), account.payouts_enabled ? 'on' : 'off']),
  ),
)}
</section>`,
  );
}
