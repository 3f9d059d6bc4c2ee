// The routes that read codes and vehicle numbers: a table of endpoint and function.
import { decodeVins, readCodes } from '../../shared/reading/contract';
import { readCode } from '../../shared/reading/read-code';
import { decodeVin } from '../../shared/reading/vin';
import { currentBook } from '../catalogue/for-others';
import { publicRoute, type Route } from '../http/route';

export const readingRoutes: readonly Route[] = [
  publicRoute(readCodes, async (call, deps) => {
    const { text, kind, donorYear } = call.body;
    const { candidates, verdict } = readCode(text, await currentBook(deps.db), { kind, donorYear });
    return { candidates, verdict };
  }),
  // Next year's models are on sale before this year is out.
  publicRoute(decodeVins, (call, deps) =>
    Promise.resolve(decodeVin(call.body.vin, deps.clock.now().getUTCFullYear() + 1)),
  ),
];
