// The states of the two legs of an order, and which of them are the end of a leg.

export const OUTBOUND_STATES = [
  'awaiting_payment',
  'paid',
  'packed',
  'in_transit',
  'collected',
  'delivered',
  'accepted',
  'refused',
  'settled',
  'cancelled',
] as const;
export type OutboundState = (typeof OUTBOUND_STATES)[number];

export const CORE_STATES = [
  'held',
  'due',
  'booked',
  'coming_back',
  'at_dock',
  'graded',
  'contested',
  'kept',
  'lapsed',
  'settled',
  /** The purchase itself was undone, so no old unit is owed. */
  'released',
] as const;
export type CoreState = (typeof CORE_STATES)[number];

export const OUTBOUND_FINAL: readonly OutboundState[] = ['accepted', 'settled', 'cancelled'];
export const CORE_FINAL: readonly CoreState[] = ['kept', 'lapsed', 'settled', 'released'];

export const LEGS = ['outbound', 'core'] as const;
export type Leg = (typeof LEGS)[number];

/** Each action that moves an order. `settle` is taken through the case, the clock's and the provider's by the server. */
export const ACTIONS = [
  'pay',
  'abandon',
  'expire',
  'cancel',
  'pack',
  'hand_over',
  'deliver',
  'accept',
  'refuse',
  'settle',
  'allow_other_core',
  'book_return',
  'send',
  'extend',
  'keep_unit',
  'lapse',
  'receive',
  'grade',
  'release',
  'agree',
  'contest',
] as const;
export type Action = (typeof ACTIONS)[number];

/**
 * Who acts. `seller` = owner or dock of the selling account; `dock` = dock duty; `both` = one side accepted the other's
 * proposal; `carrier` = proof of delivery entered by an admin or a carrier's event.
 */
export const WHO = ['builder', 'seller', 'dock', 'clock', 'provider', 'carrier', 'admin', 'both'] as const;
export type Who = (typeof WHO)[number];

export const PHOTO_PURPOSES = ['pack', 'refuse', 'core', 'grade', 'contest', 'case'] as const;
export type PhotoPurpose = (typeof PHOTO_PURPOSES)[number];
