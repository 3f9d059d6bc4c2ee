// What the rules need to know of an order, and what a step by a person, a clock or the provider brings with it.
import type { Cents } from '../kernel/money';
import type { Holds, OrderAmounts } from '../money/ledger';
import type { ActionInput, PersonAction } from './actions';
import type { Deduction, ScheduleItem } from './settlement';
import type { CoreState, OutboundState, PhotoPurpose } from './states';

/** `unknown`: the code the builder read doesn't name one family. */
export type CoreMatch = 'same' | 'different' | 'unknown';

export interface OrderFacts {
  readonly outbound: OutboundState;
  readonly core: CoreState | null;
  readonly version: number;
  readonly delivery: 'freight' | 'pickup';
  readonly amounts: OrderAmounts;
  /** From the ledger, now. */
  readonly holds: Holds;
  readonly schedule: readonly ScheduleItem[];
  readonly windowDays: number;
  /** IANA zone of the seller: all its deadlines end there. */
  readonly zone: string;
  readonly shipDays: number;
  readonly graceDays: number;
  readonly tagCode: string;
  readonly pickupCode: string;
  readonly dueAt: Date | null;
  readonly otherCoreAllowed: boolean;
  readonly deductions: readonly Deduction[] | null;
  readonly listingLive: boolean;
  /** A chargeback runs: nothing that moves money may happen. */
  readonly frozen: boolean;
  readonly photos: Readonly<Record<PhotoPurpose, readonly string[]>>;
  /** Only asked for when a return is booked. */
  readonly coreMatch: CoreMatch | null;
}

type PersonStep = {
  [A in PersonAction]: { readonly action: A; readonly input: ActionInput<A> };
}[PersonAction];

export type Step =
  | PersonStep
  | { readonly action: 'pay'; readonly amountCents: Cents; readonly currency: string }
  | { readonly action: 'expire' | 'lapse' | 'release' }
  | { readonly action: 'settle'; readonly toBuyerCents: Cents; readonly toSellerCents: Cents };
