// One idempotency key for each thing asked: pressing twice, or again after the network failed, never does it twice.
import { useRef } from 'react';

interface Asked {
  readonly body: string;
  readonly key: string;
}

/** @returns the key of a body: the same for the same body, a new one for another */
export function useRequestKey(): (body: unknown) => string {
  const asked = useRef<Asked | null>(null);
  return (body) => {
    const text = JSON.stringify(body) ?? '';
    if (asked.current?.body !== text) asked.current = { body: text, key: crypto.randomUUID() };
    return asked.current.key;
  };
}
