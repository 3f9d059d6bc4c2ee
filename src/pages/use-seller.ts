// Which seller account a member works for on the yard's pages: chosen once, kept in the browser, the first one otherwise.
import { useSyncExternalStore } from 'react';
import { useUser, type SignedIn } from '../accounts/session';

export type OwnSeller = SignedIn['sellers'][number];

const KEY = 'spragyard-seller';
const listeners = new Set<() => void>();

function chosen(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return null;
  }
}

export function chooseSeller(id: string): void {
  try {
    localStorage.setItem(KEY, id);
  } catch {
    // Without storage the first account stays chosen.
  }
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export interface SellerChoice {
  readonly seller: OwnSeller | null;
  readonly others: readonly OwnSeller[];
}

export function useSeller(): SellerChoice {
  const sellers = useUser()?.sellers ?? [];
  const id = useSyncExternalStore(subscribe, chosen);
  const seller = sellers.find((one) => one.id === id) ?? sellers[0] ?? null;
  return { seller, others: sellers };
}
