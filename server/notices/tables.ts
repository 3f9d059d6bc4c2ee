// Messages between the two sides of an order (and in its case).
import { sql } from 'drizzle-orm';
import { check, index, pgTable, text, timestamp } from 'drizzle-orm/pg-core';
import { users } from '../accounts/tables';
import { orders } from '../orders/tables';

export const messages = pgTable(
  'messages',
  {
    id: text('id').primaryKey(),
    orderId: text('order_id')
      .notNull()
      .references(() => orders.id),
    authorId: text('author_id')
      .notNull()
      .references(() => users.id),
    side: text('side').$type<'builder' | 'seller' | 'admin'>().notNull(),
    text: text('text').notNull(),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull(),
  },
  (t) => [
    index('messages_order').on(t.orderId, t.createdAt, t.id),
    check('messages_side', sql`side in ('builder','seller','admin')`),
    check('messages_text', sql`length(text) between 1 and 4000`),
  ],
);
