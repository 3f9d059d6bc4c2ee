// A client as an outsider would write it: keeps cookies, fetches the token of GET /api/auth/me for unsafe requests.

export interface Answer {
  readonly status: number;
  readonly headers: Headers;
  // Tests read answers as any outside client would: by name.
  readonly body: Json;
}

export type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

export const at = (body: Json, ...path: (string | number)[]): Json =>
  path.reduce<Json>((value, key) => {
    if (value === null || typeof value !== 'object') return null;
    return Array.isArray(value) ? (value[Number(key)] ?? null) : (value[key] ?? null);
  }, body);

export const text = (body: Json, ...path: (string | number)[]): string => String(at(body, ...path));
export const number = (body: Json, ...path: (string | number)[]): number => Number(at(body, ...path));
export const list = (body: Json, ...path: (string | number)[]): Json[] => {
  const found = at(body, ...path);
  return Array.isArray(found) ? found : [];
};

export interface Client {
  get(path: string): Promise<Answer>;
  send(
    method: 'POST' | 'PATCH' | 'PUT' | 'DELETE',
    path: string,
    body?: unknown,
    headers?: Record<string, string>,
  ): Promise<Answer>;
  post(path: string, body?: unknown, headers?: Record<string, string>): Promise<Answer>;
  upload(path: string, fields: Record<string, string>, file: Buffer, name?: string): Promise<Answer>;
  /** Cookies as name=value, for a look at them. */
  cookies(): ReadonlyMap<string, string>;
}

export function createClient(baseUrl: string): Client {
  const jar = new Map<string, string>();
  let token: string | null = null;

  const exchange = async (path: string, init: RequestInit): Promise<Answer> => {
    const headers = new Headers(init.headers);
    if (jar.size > 0) headers.set('cookie', [...jar].map(([name, value]) => `${name}=${value}`).join('; '));
    const response = await fetch(baseUrl + path, { ...init, headers, redirect: 'manual' });
    for (const line of response.headers.getSetCookie()) {
      const [pair = ''] = line.split(';');
      const split = pair.indexOf('=');
      jar.set(pair.slice(0, split), pair.slice(split + 1));
    }
    const raw = await response.text();
    const isJson = (response.headers.get('content-type') ?? '').includes('json');
    const body: Json = isJson && raw ? (JSON.parse(raw) as Json) : raw;
    const fresh = at(body, 'csrfToken');
    if (typeof fresh === 'string') token = fresh;
    return { status: response.status, headers: response.headers, body };
  };

  const unsafe = async (method: string, path: string, init: RequestInit): Promise<Answer> => {
    if (token === null) await exchange('/api/auth/me', {});
    const headers = new Headers(init.headers);
    if (!headers.has('x-csrf-token')) headers.set('x-csrf-token', token ?? '');
    return exchange(path, { ...init, method, headers });
  };

  const send: Client['send'] = (method, path, body, headers = {}) =>
    unsafe(method, path, {
      headers: { ...(body === undefined ? {} : { 'content-type': 'application/json' }), ...headers },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });

  return {
    get: (path) => exchange(path, {}),
    send,
    post: (path, body, headers) => send('POST', path, body, headers),
    upload: (path, fields, file, name = 'photo.jpg') => {
      const form = new FormData();
      for (const [key, value] of Object.entries(fields)) form.set(key, value);
      form.set('file', new Blob([new Uint8Array(file)]), name);
      return unsafe('POST', path, { body: form });
    },
    cookies: () => jar,
  };
}
