// A small endpoint for the payments stand-in's events: keeps what arrives and answers as it is told.
import { createServer } from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import { z } from 'zod';

const shape = z.object({ id: z.string(), type: z.string() });

interface Received {
  readonly payload: string;
  readonly signature: string;
  readonly event: z.output<typeof shape>;
}

export interface Receiver {
  readonly url: string;
  readonly received: Received[];
  /** Statuses of the next answers to events of a type; 200 when there is none left. */
  readonly answers: Map<string, number[]>;
  types(): string[];
  /** Waits until `count` events of a type have arrived. */
  until(type: string, count?: number): Promise<Received>;
  close(): Promise<void>;
}

export async function startReceiver(): Promise<Receiver> {
  const received: Received[] = [];
  const answers = new Map<string, number[]>();
  const server = createServer((request, response) => {
    const parts: Buffer[] = [];
    request.on('data', (part: Buffer) => parts.push(part));
    request.on('end', () => {
      const payload = Buffer.concat(parts).toString('utf8');
      const event = shape.parse(JSON.parse(payload));
      received.push({ payload, signature: String(request.headers['stripe-signature']), event });
      response.writeHead(answers.get(event.type)?.shift() ?? 200).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  const port = typeof address === 'object' && address ? address.port : 0;
  const until = async (type: string, count = 1): Promise<Received> => {
    for (let waited = 0; waited < 5_000; waited += 10) {
      const found = received.filter((each) => each.event.type === type)[count - 1];
      if (found) return found;
      await pause(10);
    }
    throw new Error(
      `${type} did not arrive ${count} times; arrived: ${received.map((each) => each.event.type).join(', ')}`,
    );
  };
  return {
    url: `http://127.0.0.1:${port}/hook`,
    received,
    answers,
    types: () => received.map((each) => each.event.type),
    until,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
