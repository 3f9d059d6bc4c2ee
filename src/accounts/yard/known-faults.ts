// The faults that a deduction can be set for, each once, with the words of the condition checklist.
import { UNIT_KINDS } from '../../../shared/catalogue/kinds';
import { faultsOf } from '../../../shared/listings/condition';

export interface KnownFault {
  readonly code: string;
  readonly label: string;
}

/** Kinds share most faults; the first kind's words stand. */
export const KNOWN_FAULTS: readonly KnownFault[] = [
  ...new Map(
    UNIT_KINDS.flatMap(faultsOf)
      .reverse()
      .map((one) => [one.code, { code: one.code, label: one.fault }] as const),
  ).values(),
].reverse();
