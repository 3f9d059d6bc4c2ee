// Serves the pages that a person sees at the provider: checkout, onboarding, start page.
import { sendHtml, type Asked } from '../http';
import type { Card } from './cards';
import { payWithCard, successUrl } from './pay';
import { closedPage, openPage, unknownPage, type Typed } from './pages/checkout-page';
import { expiredLinkPage, onboardingPage } from './pages/onboarding-page';
import { startPage } from './pages/start-page';
import { completeOnboarding } from './resources/accounts';
import { currentSession } from './resources/checkout-sessions';
import type { Webhooks } from './webhooks';
import { pageCause, type World } from './world';

/** How long a redirect waits for the product to take the event. */
const SETTLE_MS = 2_000;

interface Shown {
  readonly world: World;
  readonly webhooks: Webhooks;
}

function redirect(asked: Asked, location: string): void {
  asked.response.writeHead(303, { location, 'cache-control': 'no-store' });
  asked.response.end();
}

function readCard(form: URLSearchParams): { card: Card; typed: Typed } {
  const number = (form.get('number') ?? '').trim();
  const expiry = (form.get('expiry') ?? '').trim();
  const [, month = '0', year = '0'] = /^(\d{1,2})\s*\/?\s*(\d{2}|\d{4})$/.exec(expiry) ?? [];
  return {
    card: {
      number: number.replaceAll(/[\s-]/g, ''),
      expMonth: Number(month),
      expYear: year.length === 2 ? 2000 + Number(year) : Number(year),
      cvc: (form.get('cvc') ?? '').trim(),
    },
    typed: { number, expiry },
  };
}

async function checkout({ world, webhooks }: Shown, asked: Asked, id: string): Promise<void> {
  const { response } = asked;
  const cause = pageCause(`${asked.method} /pay/:session`);
  const lines = world.state.sessionPlans.get(id)?.lineItems ?? [];
  if (asked.method !== 'POST') {
    const session = currentSession(world, id, cause);
    world.state.journal.flush();
    webhooks.kick();
    if (session === undefined) return sendHtml(response, 404, unknownPage());
    if (session.status !== 'open')
      return sendHtml(response, 200, closedPage(session, lines, successUrl(session)));
    return sendHtml(response, 200, openPage(session, lines));
  }
  const { card, typed } = readCard(new URLSearchParams(asked.body.toString('utf8')));
  const result = payWithCard(world, id, card, cause);
  world.state.journal.flush();
  if (result.kind === 'unknown') return sendHtml(response, 404, unknownPage());
  // The event goes out before the person is sent back, so that the product usually knows by then.
  await webhooks.settled(SETTLE_MS);
  if (result.kind === 'paid') return redirect(asked, successUrl(result.session));
  if (result.kind === 'closed')
    return sendHtml(response, 409, closedPage(result.session, lines, successUrl(result.session)));
  sendHtml(response, 402, openPage(result.session, lines, typed, result.decline));
}

async function onboarding({ world, webhooks }: Shown, asked: Asked, id: string): Promise<void> {
  const { response } = asked;
  const link = world.state.accountLinks.get(id);
  const account = link && world.state.accounts.get(link.account);
  if (link === undefined || account === undefined) return sendHtml(response, 404, unknownPage());
  if (link.expiresAt <= world.seconds()) return sendHtml(response, 410, expiredLinkPage(link.refreshUrl));
  if (asked.method !== 'POST') return sendHtml(response, 200, onboardingPage(link, account));
  completeOnboarding(world, account, pageCause('POST /onboard/:link'));
  world.state.journal.flush();
  await webhooks.settled(SETTLE_MS);
  redirect(asked, link.returnUrl);
}

/** True when the path was one of the pages. */
export async function answerPage(shown: Shown, asked: Asked): Promise<boolean> {
  const path = asked.url.pathname;
  const pay = /^\/pay\/([^/]+)$/.exec(path)?.[1];
  const onboard = /^\/onboard\/([^/]+)$/.exec(path)?.[1];
  if (pay !== undefined) await checkout(shown, asked, pay);
  else if (onboard !== undefined) await onboarding(shown, asked, onboard);
  else if (path === '/') sendHtml(asked.response, 200, startPage(shown.world));
  else return false;
  return true;
}
