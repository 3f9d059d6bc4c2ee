// The stand-ins' pages in a real browser without script: a person can pay, be refused, and read mail; axe finds nothing.
import AxeBuilder from '@axe-core/playwright';
import nodemailer from 'nodemailer';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startMailFake, type MailFake } from '../../fakes/mail/start';
import { control, givenPayments, sessionParams, type Given } from './payments-given';

let browser: Browser;
let given: Given;
let mail: MailFake;
beforeAll(async () => {
  [browser, given, mail] = await Promise.all([
    chromium.launch({
      executablePath: '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    }),
    givenPayments(),
    startMailFake(),
  ]);
}, 30_000);
afterAll(async () => {
  await Promise.all([browser.close(), given.close(), mail.close()]);
});

const LOOKS = [
  { name: 'phone', viewport: { width: 390, height: 844 }, colorScheme: 'light' },
  { name: 'desk in the dark', viewport: { width: 1280, height: 900 }, colorScheme: 'dark' },
] as const;

/** Axe needs script in the page, people do not: it looks from pages of its own. */
async function violations(urls: readonly string[]): Promise<string[]> {
  const found: string[] = [];
  for (const look of LOOKS) {
    const context = await browser.newContext(look);
    const page = await context.newPage();
    for (const url of urls) {
      await page.goto(url);
      if (await page.evaluate('document.documentElement.scrollWidth > innerWidth'))
        found.push(`${look.name}: ${url} is wider than the screen`);
      // The frame's content is the sender's; its sandbox keeps axe out.
      const results = await new AxeBuilder({ page }).exclude('iframe').analyze();
      found.push(...results.violations.map((each) => `${look.name}: ${url}: ${each.id}`));
    }
    await context.close();
  }
  return found;
}

async function withoutScript(work: (page: Page) => Promise<void>): Promise<void> {
  const context: BrowserContext = await browser.newContext({ ...LOOKS[0], javaScriptEnabled: false });
  try {
    await work(await context.newPage());
  } finally {
    await context.close();
  }
}

const openSession = () =>
  given.stripe.checkout.sessions.create({
    ...sessionParams(),
    success_url: `${given.fake.url}/?paid={CHECKOUT_SESSION_ID}`,
    cancel_url: `${given.fake.url}/?cancelled`,
  });

async function fillIn(page: Page, number: string): Promise<void> {
  await page.getByLabel('Card number').fill(number);
  await page.getByLabel('Expiry').fill('12 / 40');
  await page.getByLabel('CVC').fill('123');
  await page.getByRole('button', { name: 'Pay $650.00' }).click();
}

describe('when a person pays on the hosted page without script', () => {
  test(
    'then a declined card is said on the page, and a good one pays and leads back',
    { timeout: 30_000 },
    async () => {
      const session = await openSession();
      await withoutScript(async (page) => {
        await page.goto(session.url ?? '');
        await fillIn(page, '4000 0000 0000 0002');
        const alert = page.getByRole('alert');
        expect(await alert.innerText()).toContain('Your card was declined. Nothing was charged');
        expect(await page.getByLabel('Card number').getAttribute('aria-invalid')).toBe('true');
        expect(await page.getByLabel('Card number').inputValue()).toBe('4000 0000 0000 0002');
        expect(await page.getByLabel('CVC').inputValue()).toBe('');
        await fillIn(page, '4242 4242 4242 4242');
        await page.waitForURL(`${given.fake.url}/?paid=${session.id}`);
        await page.goto(session.url ?? '');
        expect(await page.getByRole('status').innerText()).toContain('This payment went through');
      });
      expect((await given.stripe.checkout.sessions.retrieve(session.id)).payment_status).toBe('paid');
    },
  );

  test('then cancelling leads back and leaves the session open', { timeout: 30_000 }, async () => {
    const session = await openSession();
    await withoutScript(async (page) => {
      await page.goto(session.url ?? '');
      await page.getByRole('link', { name: 'Cancel and go back' }).click();
      await page.waitForURL(`${given.fake.url}/?cancelled`);
    });
    expect((await given.stripe.checkout.sessions.retrieve(session.id)).status).toBe('open');
  });
});

test(
  'when axe looks at the payment pages, then it finds nothing, light or dark, phone or desk',
  { timeout: 60_000 },
  async () => {
    const { stripe, fake } = given;
    const session = await openSession();
    const expired = await openSession();
    await control(fake, `/_expire/${expired.id}`);
    const account = await stripe.accounts.create({ type: 'express', email: 'yard@example.com' });
    const link = await stripe.accountLinks.create({
      account: account.id,
      type: 'account_onboarding',
      return_url: fake.url,
      refresh_url: fake.url,
    });
    expect(
      await violations([session.url ?? '', expired.url ?? '', link.url, fake.url, `${fake.url}/nowhere`]),
    ).toEqual([]);
  },
);

test('when axe looks at the refused payment, then it finds nothing', { timeout: 30_000 }, async () => {
  const session = await openSession();
  for (const look of LOOKS) {
    const context = await browser.newContext(look);
    const page = await context.newPage();
    await page.goto(session.url ?? '');
    await fillIn(page, '4000 0000 0000 9995');
    await page.getByRole('alert').waitFor();
    expect((await new AxeBuilder({ page }).analyze()).violations.map((each) => each.id)).toEqual([]);
    await context.close();
  }
});

test(
  'when a person reads mail without script, then its link opens and its script does not run',
  { timeout: 60_000 },
  async () => {
    const transport = nodemailer.createTransport({ host: '127.0.0.1', port: mail.smtpPort, ignoreTLS: true });
    await transport.sendMail({
      from: 'notices@spragyard.example',
      to: 'ana@example.com',
      subject: 'Check your e-mail address',
      text: `Open ${mail.url}/?to=checked%40example.com`,
      html: `<h1>Check</h1><p id="p">before</p><script>document.getElementById('p').textContent = 'script ran'</script><a href="${mail.url}/?to=checked%40example.com">Check my address</a>`,
    });
    const [message] = mail.messages();
    const context = await browser.newContext(LOOKS[1]);
    const page = await context.newPage();
    await page.goto(mail.url);
    await page.getByRole('link', { name: 'Check your e-mail address' }).click();
    const frame = page.frameLocator('iframe');
    expect(await frame.locator('#p').innerText()).toBe('before');
    const [opened] = await Promise.all([
      context.waitForEvent('page'),
      frame.getByRole('link', { name: 'Check my address' }).click(),
    ]);
    await opened.waitForURL(`${mail.url}/?to=checked%40example.com`);
    await context.close();
    expect(
      await violations([
        mail.url,
        `${mail.url}/?to=nobody%40example.com`,
        `${mail.url}/messages/${message?.id}`,
      ]),
    ).toEqual([]);
  },
);
