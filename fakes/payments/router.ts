// Routes of the API as a table: method and path pattern to the function that answers.
import type { Cause, World } from './world';

export interface Call {
  readonly world: World;
  /** The values of the `:name` segments, by name. */
  readonly ids: Readonly<Record<string, string>>;
  /** Decoded body or query, not yet checked. */
  readonly form: unknown;
  readonly path: string;
  /** The connected account that the call acts for. */
  readonly account: string | null;
  readonly cause: Cause;
}

type Handler = (call: Call) => object;
export type Routes = Readonly<Record<string, Handler>>;

export interface Found {
  readonly handler: Handler;
  readonly ids: Record<string, string>;
}

interface Compiled {
  readonly method: string;
  readonly parts: readonly string[];
  readonly handler: Handler;
}

function matched(route: Compiled, parts: readonly string[]): Record<string, string> | null {
  if (route.parts.length !== parts.length) return null;
  const ids: Record<string, string> = {};
  for (const [index, expected] of route.parts.entries()) {
    const given = parts[index] ?? '';
    if (expected.startsWith(':')) ids[expected.slice(1)] = decodeURIComponent(given);
    else if (expected !== given) return null;
  }
  return ids;
}

/** @param routes keys such as `GET /v1/refunds/:id`; an earlier one wins */
export function createRouter(routes: Routes): (method: string, path: string) => Found | null {
  const table = Object.entries(routes).map(([key, handler]): Compiled => {
    const [method = '', pattern = ''] = key.split(' ');
    return { method, parts: pattern.split('/'), handler };
  });
  return (method, path) => {
    const parts = path.split('/');
    for (const route of table) {
      const ids = route.method === method ? matched(route, parts) : null;
      if (ids !== null) return { handler: route.handler, ids };
    }
    return null;
  };
}

export const idOf = (call: Call, name = 'id'): string => call.ids[name] ?? '';
