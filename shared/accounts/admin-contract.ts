// What an admin asks of accounts: sellers to look at, people, the audit trail.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, id, idParams, line, page, pageQuery } from '../kernel/fields';
import { seller } from './seller-contract';

export const adminSellers = endpoint({
  method: 'GET',
  path: '/api/admin/sellers',
  summary: 'Seller accounts, those that wait for a look first',
  access: 'admin',
  query: z.object(pageQuery),
  answer: page(seller.extend({ members: z.number().int(), liveListings: z.number().int() })),
});

export const verifySeller = endpoint({
  method: 'POST',
  path: '/api/admin/sellers/:id/verify',
  summary: 'Say that a seller was looked at, or take it back',
  access: 'admin',
  params: idParams,
  body: z.strictObject({ verified: z.boolean() }),
  answer: seller,
});

export const adminAudit = endpoint({
  method: 'GET',
  path: '/api/admin/audit',
  summary: 'Who did what to what, newest first',
  access: 'admin',
  query: z.object({ ...pageQuery, objectId: id.optional() }),
  answer: page(
    z.object({
      id: z.string(),
      at,
      actorName: z.string().nullable(),
      actorKind: z.string(),
      action: z.string(),
      objectKind: z.string(),
      objectId: z.string(),
      detail: z.record(z.string(), z.unknown()),
    }),
  ),
});

export const adminUsers = endpoint({
  method: 'GET',
  path: '/api/admin/users',
  summary: 'People, newest first; `q` finds a part of a name or mail address',
  access: 'admin',
  query: z.object({ ...pageQuery, q: line(100).optional() }),
  answer: page(
    z.object({
      id,
      name: z.string(),
      email: z.string(),
      isAdmin: z.boolean(),
      mailChecked: z.boolean(),
      createdAt: at,
      closedAt: at.nullable(),
      sellers: z.array(z.object({ id, name: z.string() })),
    }),
  ),
});
