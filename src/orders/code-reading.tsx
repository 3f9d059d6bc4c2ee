// What a typed case code says, read back in words while it is typed.
import { queryOptions, useQuery } from '@tanstack/react-query';
import { useDeferredValue } from 'react';
import type { UnitKind } from '../../shared/catalogue/kinds';
import { readCodes } from '../../shared/reading/contract';
import { call } from '../http/client';
import { CodePlate } from '../ui/code-plate';

const LEAST = 3;

export const codeQuery = (text: string, kind: UnitKind | null) =>
  queryOptions({
    queryKey: ['orders', 'code', kind, text],
    queryFn: ({ signal }) => call(readCodes, { body: { text, ...(kind ? { kind } : {}) }, signal }),
    enabled: text.length >= LEAST,
    staleTime: Infinity,
  });

interface CodeReadingProps {
  readonly text: string;
  readonly kind: UnitKind | null;
}

export function CodeReading({ text, kind }: CodeReadingProps) {
  const typed = useDeferredValue(text.trim().toUpperCase());
  const { data, isFetching } = useQuery(codeQuery(typed, kind));
  if (typed.length < LEAST) return null;
  const best = data?.candidates[0];
  if (!data)
    return <p className="sm mute">{isFetching ? 'Reading the code' : 'The code could not be read now'}</p>;
  if (!best || data.verdict === 'cannot_tell') {
    return (
      <p className="warn" role="status">
        This code names no unit we know. Check it, or say below which unit it is.
      </p>
    );
  }
  return (
    <p className="flex flex-wrap items-center gap-10" role="status">
      <CodePlate groups={best.segments.map((one) => one.value)} size="small" />
      <span className={data.verdict === 'sure' ? 'ok' : 'warn'}>
        {data.verdict === 'sure' ? 'Reads as' : 'Probably'} {best.label}
      </span>
    </p>
  );
}
