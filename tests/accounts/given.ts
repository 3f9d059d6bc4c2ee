// What tests of accounts start from: a second process on the same database, and links out of the mailbox.
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createApp } from '../../server/app';
import type { Env } from '../../server/env';
import { makeDeps } from '../../server/make-deps';
import { createClient, type Client } from '../support/client';
import type { TestServer } from '../support/server';

export const PASSWORD = 'brass bushings and patience';
export const OTHER_PASSWORD = 'a drained pan on the bench';

export interface SecondServer {
  readonly baseUrl: string;
  client(): Client;
  close(): Promise<void>;
}

/** Another process as far as the database can tell: pool, app and limits of its own. */
export async function startSecond(server: TestServer, env: Partial<Env> = {}): Promise<SecondServer> {
  const { deps, close } = await makeDeps({ ...server.deps.env, ...env }, { clock: server.clock });
  const listener = createServer(createApp(deps));
  await new Promise<void>((resolve) => listener.listen(0, '127.0.0.1', resolve));
  const { port } = listener.address() as AddressInfo;
  const baseUrl = `http://127.0.0.1:${port}`;
  return {
    baseUrl,
    client: () => createClient(baseUrl),
    close: async () => {
      listener.closeAllConnections();
      await new Promise((resolve) => listener.close(resolve));
      await close();
    },
  };
}

/** The tokens of all links of a kind in somebody's mailbox, newest first. */
export async function linksTo(
  server: TestServer,
  email: string,
  kind: 'verify' | 'reset' | 'invite',
): Promise<string[]> {
  await server.settle();
  const pattern = new RegExp(`/${kind}/([\\w-]{20,})`);
  return server.mail
    .messages(email)
    .map((message) => pattern.exec(message.text)?.[1])
    .filter((token) => token !== undefined);
}

let people = 0;

/** An address nobody else in this run has. */
export function freshEmail(name = 'ines'): string {
  people += 1;
  return `${name}.${people}@shop.example`;
}

export async function signUp(
  server: { client(): Client },
  over: Record<string, unknown> = {},
): Promise<{ client: Client; email: string; id: string }> {
  const client = server.client();
  const email = freshEmail();
  const answer = await client.post('/api/auth/sign-up', {
    name: 'Ines Abara',
    email,
    password: PASSWORD,
    ...over,
  });
  if (answer.status !== 201) throw new Error(`sign-up: ${answer.status} ${JSON.stringify(answer.body)}`);
  const me = answer.body as { user: { id: string } };
  return { client, email, id: me.user.id };
}
