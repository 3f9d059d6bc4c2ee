// What the picture of an order is made of: the steps of its legs, the turn at the shop, and its sums.
import type { Cents } from '../../shared/kernel/money';
import type { StepState } from './art/sprag';

export interface LegStep {
  readonly key: string;
  /** "Picked up" */
  readonly label: string;
  /** "Wed 18 Feb", "by Wed 25 Mar", "2 to 4 days", "Now" */
  readonly when?: string;
  /** Money that this step moved or will move: "$1,450.00 to yard" */
  readonly money?: string;
  readonly state: StepState;
}

/** The turn of the race: what happens at the builder's shop between the legs. */
export interface RaceShop {
  /** "Your shop" to the builder, the builder's name to the yard. */
  readonly place: string;
  /** "Swapped", "Swap it" */
  readonly label: string;
  readonly when?: string;
  readonly state: StepState;
}

export interface RaceSum {
  /** "Deposit" */
  readonly label: string;
  readonly cents: Cents;
  /** "Held for you", "Released to yard", "Back to you" */
  readonly where: string;
  readonly state: 'held' | 'moved';
}
