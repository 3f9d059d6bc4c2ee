// The cautions that belong beside a unit, by its kind and what is known of it.
import type { UnitKind } from '../catalogue/kinds';
import type { Answers } from './condition';

const HEAVY: Readonly<Record<UnitKind, string>> = {
  automatic:
    'Heavy and off balance. Use a hoist or a transmission jack with its strap; keep the converter in place.',
  manual: 'Heavy and off balance. Use a hoist or a transmission jack with its strap.',
  transfer_case: 'Heavy and off balance. Use a hoist or a jack with a strap, or two people on the flat.',
  axle: 'Heavy, and it rolls. Use a hoist or two jacks; it may turn when lifted at the pinion.',
};

/** The cautions that belong beside this unit. The service manual, local rules and licensed practice come first. */
export function hazards(kind: UnitKind, state: 'in_vehicle' | 'pulled', given: Answers): string[] {
  const list = [HEAVY[kind]];
  if (state === 'in_vehicle') {
    list.push(
      'Never under a vehicle held by a jack alone: rated stands on hard level ground, wheels chocked.',
    );
  }
  if (kind === 'automatic' && given['converter'] !== 'no') {
    list.push('The converter can slide out of the bell when the unit tips. Strap it.');
  }
  if (given['drained'] !== 'yes') {
    list.push('Fluid may be left inside: drain and plug before it moves, catch it, hand it in as used oil.');
  }
  return list;
}
