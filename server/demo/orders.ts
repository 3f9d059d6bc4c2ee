// Orders in every state of both legs, walked there by the same steps that people take, with the clock set back.
import type { Actor } from '../../shared/accounts/actor';
import type { PersonAction } from '../../shared/orders/actions';
import type { Step } from '../../shared/orders/facts';
import type { PhotoPurpose } from '../../shared/orders/states';
import { eq } from 'drizzle-orm';
import type { Deps } from '../deps';
import { isRefusal } from '../http/refusal';
import { actOnOrder, type OrderRow } from '../orders/for-others';
import { addOrderPhoto } from '../orders/add-photo';
import { applyPayment } from '../orders/apply-payment';
import { reserveUnit } from '../orders/reserve';
import { takeAction, type PersonStep } from '../orders/take-action';
import { orders } from '../orders/tables';
import type { Cast } from './people';
import { renderedPicture } from './pictures';
import type { MovableClock, SeededUnit } from './units';

const HOUR_MS = 3_600_000;

export interface Stage {
  readonly deps: Deps;
  readonly cast: Cast;
  readonly clock: MovableClock;
  readonly now: Date;
}

type Input<A extends PersonAction> = Omit<Extract<PersonStep, { action: A }>['input'], 'version'>;

/** One order being walked through its states; hours are counted back from now. */
export interface Walk {
  readonly builder: Actor;
  readonly dock: Actor;
  at(hoursAgo: number): void;
  order(): Promise<OrderRow>;
  photo(who: Actor, purpose: PhotoPurpose, picture: string, shot?: string): Promise<string>;
  take<A extends PersonAction>(who: Actor, action: A, input: Input<A>): Promise<void>;
  settle(
    leg: 'outbound' | 'core',
    toBuyerCents: number,
    toSellerCents: number,
    finding: string,
  ): Promise<void>;
  strike(action: 'lapse' | 'release'): Promise<void>;
}

function must<T>(result: T, what: string): Exclude<T, { refusal: unknown }> {
  if (isRefusal(result)) throw new Error(`${what}: ${result.detail} ${JSON.stringify(result.errors ?? [])}`);
  return result as Exclude<T, { refusal: unknown }>;
}

const DELIVERY = {
  name: 'Ines Abara',
  line1: '12 Shop Lane',
  city: 'Reno',
  region: 'NV',
  zip: '89501',
};

async function readOrder(deps: Deps, id: string): Promise<OrderRow> {
  const [row] = await deps.db.select().from(orders).where(eq(orders.id, id));
  if (!row) throw new Error(`order ${id} is gone`);
  return row;
}

export interface Opening {
  readonly unit: SeededUnit;
  readonly builderEmail: string;
  readonly terms?: 'exchange' | 'outright';
  readonly method?: 'freight' | 'pickup';
  readonly hoursAgo: number;
  readonly paid?: boolean;
}

/** Reserves the unit and pays at the stand-in, as its page would. */
export async function openOrder(stage: Stage, opening: Opening): Promise<Walk> {
  const { deps, cast, clock, now } = stage;
  const at = (hoursAgo: number): void => clock.set(new Date(now.getTime() - hoursAgo * HOUR_MS));
  const builder = await cast.actor(opening.builderEmail);
  const dockMember = opening.unit.seller.spec.members.find(([, duties]) => duties.includes('dock'));
  const dock = await cast.actor(dockMember?.[0] ?? '');
  at(opening.hoursAgo);
  const reserved = must(
    await reserveUnit(deps, builder, {
      listingId: opening.unit.listingId,
      terms: opening.terms ?? 'exchange',
      delivery: { method: opening.method ?? 'freight', ...DELIVERY, name: builder.name },
    }),
    'reserve',
  );
  const id = reserved.order.id;
  if (opening.paid !== false) {
    const { checkoutSessionId } = await readOrder(deps, id);
    const host = deps.env.STRIPE_HOST ?? '';
    await fetch(`${host}/_complete/${checkoutSessionId ?? ''}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ card: '4242424242424242' }),
    });
    await applyPayment(deps, checkoutSessionId ?? '');
  }
  const system = async (
    roles: ('clock' | 'admin')[],
    step: Step,
    leg?: 'outbound' | 'core',
    finding?: string,
  ) => {
    const admin = await cast.actor('admin@demo.example');
    const actorUserId = roles.includes('admin') ? admin.userId : null;
    must(
      await actOnOrder(deps, {
        orderId: id,
        roles,
        step,
        actorUserId,
        ...(leg ? { leg } : {}),
        ...(finding ? { finding } : {}),
      }),
      step.action,
    );
  };
  return {
    builder,
    dock,
    at,
    order: () => readOrder(deps, id),
    photo: async (who, purpose, picture, shot) => {
      const bytes = await renderedPicture(picture);
      const added = await addOrderPhoto(deps, who, {
        orderId: id,
        purpose,
        shot,
        file: { bytes, name: `${picture}.jpg` },
        photosNow: 0,
      });
      return must(added, 'photo').photo.id;
    },
    take: async (who, action, input) => {
      const { version } = await readOrder(deps, id);
      const step = { action, input: { ...input, version } } as unknown as PersonStep;
      must(await takeAction(deps, who, id, step), action);
    },
    settle: (leg, toBuyerCents, toSellerCents, finding) =>
      system(['admin'], { action: 'settle', toBuyerCents, toSellerCents }, leg, finding),
    strike: (action) => system(['clock'], { action }),
  };
}
