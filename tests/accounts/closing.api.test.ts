// Closing an account: refused while anything hangs on it, complete when it goes.
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { at, text } from '../support/client';
import {
  addMember,
  givenCatalogue,
  givenListing,
  givenPerson,
  givenYard,
  PASSWORD as SHARED,
} from '../support/given';
import { startTestServer, type TestServer } from '../support/server';
import { startStory } from '../support/story';
import { PASSWORD, signUp } from './given';

let server: TestServer;

beforeAll(async () => {
  server = await startTestServer({ background: false });
  await givenCatalogue(server);
});
afterAll(() => server.close());

describe('closing an account', () => {
  it('when nothing hangs on it, then nobody can sign in, the address is free again, and the person is told', async () => {
    const { client, email, id } = await signUp(server, {
      seller: { name: 'Lone Shop', kind: 'private', zip: '83702' },
    });
    const sellerId = text((await client.get('/api/auth/me')).body, 'user', 'sellers', 0, 'id');
    const phone = server.client();
    await phone.post('/api/auth/sign-in', { email, password: PASSWORD });
    const wrong = await client.post('/api/account/close', { password: 'not this one at all' });
    expect(wrong.status).toBe(422);
    expect((await client.post('/api/account/close', { password: PASSWORD })).status).toBe(204);
    expect(at((await client.get('/api/auth/me')).body, 'user')).toBeNull();
    expect(at((await phone.get('/api/auth/me')).body, 'user')).toBeNull();
    expect((await server.client().post('/api/auth/sign-in', { email, password: PASSWORD })).status).toBe(401);
    expect((await server.client().get(`/api/sellers/${sellerId}`)).status).toBe(404);
    await server.settle();
    expect(server.mail.messages(email)[0]?.subject).toBe('Your account is closed');
    const again = await server
      .client()
      .post('/api/auth/sign-up', { name: 'Ines', email, password: PASSWORD });
    expect(again.status).toBe(201);
    expect(text(again.body, 'user', 'id')).not.toBe(id);
  });

  it('when an order is open, then neither its builder nor the seller’s only member can close', async () => {
    const yard = await givenYard(server);
    const builder = await givenPerson(server, 'Builder');
    const story = await startStory(server, { builder, yard, listing: await givenListing(server, yard) });
    await story.pay();
    await server.settle();
    const bought = await builder.client.post('/api/account/close', { password: SHARED });
    expect(bought.status).toBe(409);
    await server.database.pool.query('delete from seller_members where seller_id = $1 and user_id <> $2', [
      yard.id,
      yard.owner.id,
    ]);
    const sold = await yard.owner.client.post('/api/account/close', { password: SHARED });
    expect(sold.status).toBe(409);
    expect(text(sold.body, 'detail')).toContain('open orders');
  });

  it('when units are on offer, then the only member cannot close', async () => {
    const yard = await givenYard(server, 'Offer Yard');
    await givenListing(server, yard);
    await server.database.pool.query('delete from seller_members where seller_id = $1 and user_id <> $2', [
      yard.id,
      yard.owner.id,
    ]);
    const answer = await yard.owner.client.post('/api/account/close', { password: SHARED });
    expect(answer.status).toBe(409);
  });

  it('when others would be left without an owner, then it is refused; with another owner it goes', async () => {
    const yard = await givenYard(server, 'Two Yard');
    const close = () => yard.owner.client.post('/api/account/close', { password: SHARED });
    const refused = await close();
    expect(refused.status).toBe(409);
    expect(text(refused.body, 'detail')).toContain('without an owner');
    await addMember(server, yard.id, yard.dock.id, ['owner', 'dock']);
    expect((await close()).status).toBe(204);
    expect((await yard.dock.client.get(`/api/sellers/${yard.id}/team`)).status).toBe(200);
  });

  it('when an admin asks, then it is refused', async () => {
    const admin = await givenPerson(server, 'Admin', { admin: true });
    expect((await admin.client.post('/api/account/close', { password: SHARED })).status).toBe(409);
  });
});
