// The inbox that a person reads in the demo: a list, and one mail with its text beside it.
import { escapeHtml, page } from '../page';
import type { Message } from './messages';

const BANNER = 'Mail stand-in: nothing here has been sent to anybody';
const SHOWN = 200;

const time = (at: string): string =>
  `<time datetime="${escapeHtml(at)}">${escapeHtml(at.slice(0, 19).replace('T', ' '))} UTC</time>`;

const row = (message: Message): string => `<tr>
<td><a href="/messages/${escapeHtml(message.id)}">${escapeHtml(message.subject || 'No subject')}</a></td>
<td>${escapeHtml(message.to)}</td>
<td class="soft">${time(message.at)}</td>
</tr>`;

export function inboxPage(messages: readonly Message[], to: string): string {
  const shown = messages.slice(0, SHOWN);
  const list =
    shown.length === 0
      ? `<p class="soft">${to ? `No mail to ${escapeHtml(to)}.` : 'No mail yet.'}</p>`
      : `<table>
<thead><tr><th scope="col">Subject</th><th scope="col">To</th><th scope="col">Arrived</th></tr></thead>
<tbody>${shown.map(row).join('\n')}</tbody>
</table>
${messages.length > SHOWN ? `<p class="soft">The newest ${SHOWN} of ${messages.length}.</p>` : ''}`;
  return page(
    'Inbox',
    BANNER,
    `<h1>Inbox</h1>
<form class="card" method="get" action="/" role="search">
<label for="to">Only mail to</label>
<div class="pair"><input id="to" name="to" type="email" value="${escapeHtml(to)}" placeholder="builder@demo.example" autocomplete="off">
<div><button type="submit">Show</button>${to ? ' <a href="/">Show all</a>' : ''}</div></div>
</form>
<section class="card" aria-labelledby="mails">
<h2 id="mails">${messages.length} ${messages.length === 1 ? 'mail' : 'mails'}${to ? ` to ${escapeHtml(to)}` : ''}, newest first</h2>
${list}
</section>
${messages.length > 0 ? '<form class="foot" method="post" action="/delete-all"><button class="plain" type="submit">Delete all mail</button></form>' : ''}`,
  );
}

const attachmentsOf = (message: Message): string =>
  message.attachments.length === 0
    ? ''
    : `<dt>Attachments</dt><dd>${message.attachments
        .map(
          (attachment, index) =>
            `<a href="/api/messages/${escapeHtml(message.id)}/attachments/${index}">${escapeHtml(attachment.filename)}</a> <span class="soft">(${escapeHtml(attachment.contentType)}, ${attachment.bytes} bytes)</span>`,
        )
        .join('<br>')}</dd>`;

export const messagePage = (message: Message): string =>
  page(
    message.subject || 'No subject',
    BANNER,
    `<p><a href="/">Back to the inbox</a></p>
<h1>${escapeHtml(message.subject || 'No subject')}</h1>
<div class="card"><dl>
<dt>From</dt><dd>${escapeHtml(message.from)}</dd>
<dt>To</dt><dd>${escapeHtml(message.to)}</dd>
<dt>Arrived</dt><dd>${time(message.at)}</dd>
${message.messageId ? `<dt>Message-ID</dt><dd>${escapeHtml(message.messageId)}</dd>` : ''}
${attachmentsOf(message)}
<dt>As it came</dt><dd><a href="/api/messages/${escapeHtml(message.id)}/raw">source</a></dd>
</dl></div>
<div class="columns reading">
<section aria-labelledby="html"><h2 id="html">As a page</h2>
${
  message.html === null
    ? '<p class="soft">This mail is text only.</p>'
    : `<iframe title="The mail as a page" src="/messages/${escapeHtml(message.id)}/html" sandbox="allow-popups allow-popups-to-escape-sandbox"></iframe>`
}
</section>
<section class="card" aria-labelledby="text"><h2 id="text">As text</h2><pre>${escapeHtml(message.text)}</pre></section>
</div>`,
  );

export const missingPage = (): string =>
  page(
    'No such mail',
    BANNER,
    '<h1>No such mail</h1><p>It was deleted, or never arrived.</p><p><a href="/">Inbox</a></p>',
  );

/** The mail's own HTML; its links open in a new tab, since the frame can't go anywhere. */
export const framed = (html: string): string => `<!doctype html><base target="_blank">${html}`;
