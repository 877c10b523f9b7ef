import { AsyncLocalStorage } from 'node:async_hooks';

/**
 * Stands in for the request scope that Next opens around pages and actions: `next/headers` reads from here in tests.
 * In the test file: vi.mock('next/headers', async () => (await import('../request-scope')).nextHeaders);
 */
interface Scope {
  headers: Headers;
  cookies: Map<string, string>;
  /** Cookies set during the request, with their options. */
  set: Map<string, { value: string; options: Record<string, unknown> }>;
}

const storage = new AsyncLocalStorage<Scope>();

function scope(): Scope {
  const found = storage.getStore();
  if (!found) throw new Error('There is no request around this call.');
  return found;
}

export const nextHeaders = {
  headers: async () => scope().headers,
  cookies: async () => {
    const { cookies, set } = scope();
    return {
      get: (name: string) => (cookies.has(name) ? { name, value: cookies.get(name) } : undefined),
      getAll: () => [...cookies].map(([name, value]) => ({ name, value })),
      set: (name: string, value: string, options: Record<string, unknown> = {}) => {
        cookies.set(name, value);
        set.set(name, { value, options });
      },
    };
  },
};

/** Runs what a page or an action does as part of one request with these headers; gives its result and the cookies that it set. */
export async function withinRequest<Result>(headers: Record<string, string>, run: () => Promise<Result>) {
  const cookies = new Map<string, string>();
  for (const pair of (headers.cookie ?? '').split(/; */)) {
    const at = pair.indexOf('=');
    if (at > 0) cookies.set(pair.slice(0, at), decodeURIComponent(pair.slice(at + 1)));
  }
  const opened: Scope = { headers: new Headers(headers), cookies, set: new Map() };
  const result = await storage.run(opened, run);
  return { result, set: opened.set };
}
