// The steps of an order as both sides take them over HTTP.
import type { Answer } from './client';
import { number, text } from './client';
import { DELIVERY, givenJpeg, type GivenListing, type Person, type Yard } from './given';
import type { TestServer } from './server';

export interface Story {
  readonly server: TestServer;
  readonly builder: Person;
  readonly yard: Yard;
  readonly listing: GivenListing;
  readonly orderId: string;
  /** The order as somebody sees it now. */
  see(who?: Person): Promise<Answer>;
  /** Takes an action with the current version and answers whatever came. */
  act(who: Person, action: string, input?: Record<string, unknown>): Promise<Answer>;
  /** Takes an action that must go through. */
  must(who: Person, action: string, input?: Record<string, unknown>): Promise<Answer>;
  photo(who: Person, purpose: string): Promise<string>;
  pay(card?: string): Promise<void>;
}

export async function reserve(
  builder: Person,
  listing: GivenListing,
  over: Record<string, unknown> = {},
): Promise<Answer> {
  return builder.client.post('/api/orders', {
    listingId: listing.id,
    terms: 'exchange',
    delivery: DELIVERY,
    ...over,
  });
}

const sessionOf = (checkoutUrl: string): string => checkoutUrl.split('/pay/')[1] ?? '';

export async function startStory(
  server: TestServer,
  people: { builder: Person; yard: Yard; listing: GivenListing },
  over: Record<string, unknown> = {},
): Promise<Story> {
  const { builder, yard, listing } = people;
  const made = await reserve(builder, listing, over);
  if (made.status !== 201) throw new Error(`reserve: ${made.status} ${JSON.stringify(made.body)}`);
  const orderId = text(made.body, 'order', 'id');
  const see = (who: Person = builder): Promise<Answer> => who.client.get(`/api/orders/${orderId}`);
  const act: Story['act'] = async (who, action, input = {}) => {
    const now = await see(who);
    return who.client.post(`/api/orders/${orderId}/actions/${action}`, {
      version: number(now.body, 'version'),
      ...input,
    });
  };
  return {
    server,
    builder,
    yard,
    listing,
    orderId,
    see,
    act,
    must: async (who, action, input) => {
      const answer = await act(who, action, input);
      if (answer.status !== 200)
        throw new Error(`${action}: ${answer.status} ${JSON.stringify(answer.body)}`);
      return answer;
    },
    photo: async (who, purpose) => {
      const answer = await who.client.upload(`/api/orders/${orderId}/photos`, { purpose }, await givenJpeg());
      if (answer.status !== 201) throw new Error(`photo: ${answer.status} ${JSON.stringify(answer.body)}`);
      return text(answer.body, 'id');
    },
    pay: async (card = '4242424242424242') => {
      const session = sessionOf(text(made.body, 'checkoutUrl'));
      await fetch(`${server.payments.url}/_complete/${session}`, {
        method: 'POST',
        headers: { 'content-type': 'application/json' },
        body: JSON.stringify({ card }),
      });
      await server.settle();
    },
  };
}

/** paid -> packed -> in transit -> delivered. */
export async function deliver(story: Story): Promise<void> {
  const { dock } = story.yard;
  for (let i = 0; i < 3; i += 1) await story.photo(dock, 'pack');
  await story.must(dock, 'pack', { tagCode: story.listing.tagCode, drained: true, plugged: true });
  await story.must(dock, 'hand_over', { carrier: 'Redline Freight', tracking: 'PRO 7714' });
  await story.must(story.builder, 'deliver');
}

/** due -> booked -> coming back -> at the dock. */
export async function sendBack(story: Story): Promise<void> {
  for (let i = 0; i < 3; i += 1) await story.photo(story.builder, 'core');
  await story.must(story.builder, 'book_return', { caseCode: 'K66A 4X 55512' });
  await story.must(story.builder, 'send', { method: 'drop_off' });
  await story.must(story.yard.dock, 'receive');
}

export async function grade(story: Story, codes: readonly string[], letter = 'B'): Promise<Answer> {
  const deductions = [];
  for (const code of codes) deductions.push({ code, photoId: await story.photo(story.yard.dock, 'grade') });
  return story.must(story.yard.dock, 'grade', { grade: letter, deductions });
}
