// The readers' questions on the page.
import { queryOptions } from '@tanstack/react-query';
import type { UnitKind } from '../../shared/catalogue/kinds';
import { decodeVins, readCodes } from '../../shared/reading/contract';
import { normaliseCode } from '../../shared/reading/segment-text';
import { normaliseVin } from '../../shared/reading/vin';
import { call } from '../http/client';

/** Fewer known characters than this say nothing. */
const CODE_LEAST = 3;
/** Before that a person is still typing. */
const VIN_LEAST = 11;

export interface CodeQuestion {
  readonly text: string;
  readonly kind: UnitKind | null;
  readonly donorYear: number | null;
}

export const codeQuery = ({ text, kind, donorYear }: CodeQuestion) =>
  queryOptions({
    queryKey: ['reading', 'code', normaliseCode(text), kind, donorYear],
    queryFn: ({ signal }) =>
      call(readCodes, {
        body: { text, ...(kind ? { kind } : {}), ...(donorYear ? { donorYear } : {}) },
        signal,
      }),
    enabled: normaliseCode(text).replaceAll('?', '').length >= CODE_LEAST,
    staleTime: Infinity,
  });

export const vinQuery = (vin: string) =>
  queryOptions({
    queryKey: ['reading', 'vin', normaliseVin(vin)],
    queryFn: ({ signal }) => call(decodeVins, { body: { vin }, signal }),
    enabled: normaliseVin(vin).length >= VIN_LEAST,
    staleTime: Infinity,
  });
