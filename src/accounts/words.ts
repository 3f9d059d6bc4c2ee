// How people, duties and seller accounts are called on the pages of accounts.
import type { Duty, SellerKind } from '../../shared/accounts/actor';
import type { RadioOption } from '../ui/form/radio-group';

export const KIND_WORDS: Readonly<Record<SellerKind, string>> = {
  yard: 'Salvage yard',
  rebuilder: 'Rebuilder',
  private: 'Private seller',
};

export const KIND_OPTIONS: readonly RadioOption<SellerKind>[] = [
  { value: 'yard', label: 'A salvage yard' },
  { value: 'rebuilder', label: 'A shop that rebuilds units' },
  { value: 'private', label: 'Private: I sell what came out of my truck' },
];

export const DUTY_WORDS: Readonly<Record<Duty, { readonly name: string; readonly does: string }>> = {
  owner: { name: 'Owner', does: 'sets terms, team and payouts' },
  lister: { name: 'Lister', does: 'lists donor vehicles and units' },
  dock: { name: 'Dock', does: 'packs, hands over, receives and grades' },
};
