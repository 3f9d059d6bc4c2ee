// The web side of the mail stand-in: messages as JSON for tests, as pages for people.
import { sendHtml, sendJson, type Asked } from '../http';
import { framed, inboxPage, messagePage, missingPage } from './inbox-pages';
import type { Message, Messages } from './messages';

function sendFrame({ response }: Asked, html: string): void {
  response.writeHead(200, {
    'content-type': 'text/html; charset=utf-8',
    // Whoever opens the frame's address by itself gets no script either.
    'content-security-policy':
      "default-src 'none'; style-src 'unsafe-inline'; img-src data:; sandbox allow-popups allow-popups-to-escape-sandbox",
    'x-content-type-options': 'nosniff',
  });
  response.end(framed(html));
}

function sendFile({ response }: Asked, data: Buffer, contentType: string, filename: string): void {
  response.writeHead(200, {
    'content-type': contentType,
    'content-disposition': `attachment; filename*=UTF-8''${encodeURIComponent(filename)}`,
    'content-security-policy': "default-src 'none'; sandbox",
    'x-content-type-options': 'nosniff',
  });
  response.end(data);
}

async function answerOne(messages: Messages, asked: Asked, message: Message, rest: string): Promise<boolean> {
  const index = /^attachments\/(\d+)$/.exec(rest)?.[1];
  if (rest === '') sendJson(asked.response, 200, message);
  else if (rest === 'raw')
    sendFile(asked, await messages.raw(message.id), 'message/rfc822', `${message.id}.eml`);
  else if (index !== undefined) {
    const attachment = await messages.attachment(message.id, Number(index));
    if (attachment === undefined) sendJson(asked.response, 404, { error: 'no such attachment' });
    else sendFile(asked, attachment.content, attachment.contentType, attachment.filename ?? 'unnamed');
  } else return false;
  return true;
}

async function answerApi(messages: Messages, asked: Asked): Promise<boolean> {
  const { method, url, response } = asked;
  if (url.pathname === '/api/messages' && method === 'GET') {
    sendJson(response, 200, messages.list(url.searchParams.get('to')));
    return true;
  }
  if (url.pathname === '/api/messages' && method === 'DELETE') {
    messages.clear();
    response.writeHead(204).end();
    return true;
  }
  const [, id, rest = ''] = /^\/api\/messages\/([0-9a-f]+)(?:\/(.+))?$/.exec(url.pathname) ?? [];
  if (id === undefined || method !== 'GET') return false;
  const message = messages.get(id);
  if (message !== undefined) return answerOne(messages, asked, message, rest);
  sendJson(response, 404, { error: 'no such message' });
  return true;
}

/** Answers everything but the faults and the state. */
export async function answerInbox(messages: Messages, asked: Asked): Promise<void> {
  const { method, url, response } = asked;
  if (await answerApi(messages, asked)) return;
  if (url.pathname === '/delete-all' && method === 'POST') {
    messages.clear();
    response.writeHead(303, { location: '/' }).end();
    return;
  }
  if (url.pathname === '/') {
    const to = url.searchParams.get('to') ?? '';
    return sendHtml(response, 200, inboxPage(messages.list(to), to));
  }
  const [, id = '', html] = /^\/messages\/([0-9a-f]+)(\/html)?$/.exec(url.pathname) ?? [];
  const message = messages.get(id);
  if (message === undefined) return sendHtml(response, 404, missingPage());
  if (html === undefined) return sendHtml(response, 200, messagePage(message));
  sendFrame(asked, message.html ?? '');
}
