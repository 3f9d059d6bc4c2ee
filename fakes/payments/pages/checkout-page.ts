// The hosted checkout page: what is bought, the total, and a card form that works without script.
import { dollars, escapeHtml, page } from '../../page';
import type { Decline } from '../cards';
import type { LineItem, Session } from '../model/payments';

export const BANNER = 'Payments stand-in: no real card is charged';

/** What the person typed, to be shown again after an error (never the security code). */
export interface Typed {
  readonly number: string;
  readonly expiry: string;
}

type Field = Decline['field'];

const LABELS: Readonly<Record<Field, string>> = {
  number: 'Card number',
  expiry: 'Expiry (MM/YY)',
  cvc: 'CVC (3 digits)',
};

function input(field: Field, attributes: string, value: string, decline: Decline | null): string {
  const wrong = decline?.field === field;
  return `<div class="field">
<label for="${field}">${LABELS[field]}</label>
<input id="${field}" name="${field}" value="${escapeHtml(value)}" required inputmode="numeric" ${attributes}${
    wrong ? ` aria-invalid="true" aria-describedby="${field}-wrong"` : ''
  }>
${wrong ? `<p class="wrong" id="${field}-wrong">${escapeHtml(decline.message)}</p>` : ''}
</div>`;
}

const summary = (
  session: Session,
  lines: readonly LineItem[],
): string => `<section class="card" aria-labelledby="summary">
<h2 id="summary">What you pay for</h2>
<table>
<thead><tr><th scope="col">Item</th><th scope="col" class="number">Amount</th></tr></thead>
<tbody>
${lines
  .map(
    (line) =>
      `<tr><td>${escapeHtml(line.description)}${line.quantity > 1 ? ` <span class="soft">× ${line.quantity}</span>` : ''}</td>` +
      `<td class="number">${dollars(line.amount_total, line.currency)}</td></tr>`,
  )
  .join('\n')}
</tbody>
<tfoot><tr><th scope="row">Total</th><td class="number">${dollars(session.amount_total, session.currency)}</td></tr></tfoot>
</table>
${session.customer_email ? `<p class="soft">Receipt to ${escapeHtml(session.customer_email)}</p>` : ''}
</section>`;

const cancelLink = (session: Session): string =>
  session.cancel_url
    ? `<p class="foot"><a href="${escapeHtml(session.cancel_url)}">Cancel and go back</a></p>`
    : '';

function cardForm(session: Session, typed: Typed, decline: Decline | null): string {
  const total = dollars(session.amount_total, session.currency);
  const free = session.amount_total === 0;
  return `<section class="card" aria-labelledby="card">
<h2 id="card">${free ? 'Nothing to pay' : 'Pay with a card'}</h2>
<form method="post" action="/pay/${escapeHtml(session.id)}" novalidate>
${
  free
    ? '<p>The total is zero, so no card is needed.</p>'
    : `${input('number', 'autocomplete="cc-number" maxlength="23"', typed.number, decline)}
<div class="pair">
${input('expiry', 'autocomplete="cc-exp" maxlength="7"', typed.expiry, decline)}
${input('cvc', 'autocomplete="cc-csc" maxlength="4"', '', decline)}
</div>`
}
<button class="wide" type="submit">${free ? 'Confirm' : `Pay ${total}`}</button>
</form>
${cancelLink(session)}
</section>
${free ? '' : TEST_CARDS}`;
}

const TEST_CARDS = `<section class="card" aria-labelledby="cards">
<h2 id="cards">Test cards</h2>
<p class="soft">Any date in the future, any three digits.</p>
<dl>
<dt>Pays</dt><dd><code>4242 4242 4242 4242</code></dd>
<dt>Declined</dt><dd><code>4000 0000 0000 0002</code></dd>
<dt>Too little money</dt><dd><code>4000 0000 0000 9995</code></dd>
</dl>
</section>`;

export function openPage(
  session: Session,
  lines: readonly LineItem[],
  typed: Typed = { number: '', expiry: '' },
  decline: Decline | null = null,
): string {
  const failed =
    decline === null
      ? ''
      : `<div class="notice bad" role="alert"><p><strong>Not paid.</strong> ${escapeHtml(decline.message)} Nothing was charged; you can try again.</p></div>`;
  return page(
    decline === null ? 'Pay by card' : 'Not paid: try again',
    BANNER,
    `<h1>Pay ${dollars(session.amount_total, session.currency)}</h1>
${failed}
<div class="columns">
${summary(session, lines)}
<div>
${cardForm(session, typed, decline)}
</div>
</div>`,
  );
}

/** For a session that can no longer be paid. */
export function closedPage(session: Session, lines: readonly LineItem[], goOn: string): string {
  const done = session.status === 'complete';
  const [title, kind, text] = done
    ? ['Already paid', 'good', 'This payment went through. You can close this page or go back.']
    : [
        'This page has expired',
        'bad',
        'The time to pay has run out, and nothing was charged. Go back and start again.',
      ];
  const back = done ? goOn : session.cancel_url;
  return page(
    title,
    BANNER,
    `<h1>${title}</h1>
<div class="notice ${kind}" role="status"><p>${text}</p></div>
${summary(session, lines)}
${back ? `<p class="foot"><a class="button" href="${escapeHtml(back)}">Go back</a></p>` : ''}`,
  );
}

export const unknownPage = (): string =>
  page(
    'No such page',
    BANNER,
    `<h1>No such page</h1>
<div class="notice bad"><p>This link is not one of ours, or it is incomplete.</p></div>
<p><a href="/">Start page of the stand-in</a></p>`,
  );
