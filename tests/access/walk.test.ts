import { NextRequest } from 'next/server';
import { afterAll, beforeAll, describe, expect, test, vi } from 'vitest';
import { decideAccess, type Access, type AccessDecision } from '@/lib/access/access';
import { surface } from '@/lib/access/surface';
import { temporaryDatabase, type TemporaryDatabase } from '../database/temporary-postgres';
import { handlerFileOf, pageFileOf } from './found-surface';
import { makeVisitors, type TestVisitor } from './visitors';

/** The request that the code under test believes it serves. */
const asked: { cookies: Record<string, string>; headers: Headers } = { cookies: {}, headers: new Headers() };

vi.mock('next/headers', () => ({
  cookies: async () => ({
    getAll: () => Object.entries(asked.cookies).map(([name, value]) => ({ name, value })),
    get: (name: string) => (name in asked.cookies ? { name, value: asked.cookies[name] } : undefined),
    set: () => {},
    delete: () => {},
  }),
  headers: async () => asked.headers,
}));
vi.mock('next/cache', () => ({ revalidatePath: () => {}, revalidateTag: () => {}, refresh: () => {} }));

const origin = 'http://127.0.0.1:3000';
const modules = import.meta.glob(['../../app/**/{page,route}.{ts,tsx}', '../../app/**/actions.ts']);
const load = async (file: string) =>
  (await modules[`../../${file}`]!()) as Record<string, (...given: unknown[]) => unknown>;

let open: TemporaryDatabase;
let visitors: TestVisitor[];
beforeAll(async () => {
  open = await temporaryDatabase();
  ({ visitors } = await makeVisitors(open.db));
});
afterAll(() => open.close());

/** What the first line of a page or action decided. Whatever happens after it counts as allowed. */
async function decisionOf(call: () => unknown): Promise<AccessDecision> {
  try {
    await call();
    return 'allowed';
  } catch (error) {
    const digest = String((error as { digest?: unknown }).digest ?? '');
    if (!digest.startsWith('NEXT_REDIRECT')) return 'allowed';
    if (/;\/sign-in(\?|;)/.test(digest)) return 'sign-in';
    return digest.includes(';/not-allowed;') ? 'not-allowed' : 'allowed';
  }
}

/** Every visitor's decision must be the table's. Pages of a bench are the proxy's: which bench it is decides further. */
async function expectTable(access: Access, decide: (cookies: Record<string, string>) => Promise<AccessDecision>) {
  const seen: Record<string, AccessDecision> = {};
  const wanted: Record<string, AccessDecision> = {};
  for (const { name, visitor, cookies } of visitors) {
    seen[name] = await decide(await cookies());
    wanted[name] = decideAccess(access, visitor);
  }
  expect(seen).toEqual(wanted);
}

const cookieHeader = (cookies: Record<string, string>) =>
  Object.entries(cookies)
    .map(([name, value]) => `${name}=${value}`)
    .join('; ');

const pathOf = (route: string) => route.replace(/\[(\.\.\.)?[^\]]+\]/g, '00000000-0000-4000-8000-000000000000');
const guarded = (part: Record<string, Access>) => Object.entries(part).filter(([, access]) => access !== 'public');

describe('each page asks for the access it is listed with', () => {
  const pages = guarded(surface.pages).filter(([, access]) => access !== 'bench');
  test.each(pages)('%s: %s', async (route, access) => {
    const page = await load(pageFileOf(route));
    await expectTable(access, (cookies) => {
      Object.assign(asked, { cookies, headers: new Headers({ 'x-sillwright-path': pathOf(route) }) });
      return decisionOf(() => page.default!({ params: Promise.resolve({}), searchParams: Promise.resolve({}) }));
    });
  });
});

describe('each server action asks for the access it is listed with', () => {
  test.each(guarded(surface.actions))('%s: %s', async (key, access) => {
    const [file, name] = key.split('#') as [string, string];
    const action = (await load(file))[name]!;
    await expectTable(access, (cookies) => {
      Object.assign(asked, { cookies, headers: new Headers({ origin }) });
      return decisionOf(() => action());
    });
  });
});

describe('each route handler asks for the access it is listed with, and refuses writes from other sites', () => {
  const decisions: Record<number, AccessDecision> = { 401: 'sign-in', 403: 'not-allowed' };
  async function answer(key: string, cookies: Record<string, string>, from: string) {
    const [method, route] = key.split(' ') as [string, string];
    const handler = (await load(handlerFileOf(key)))[method]!;
    const url = `${origin}${pathOf(route)}`;
    const headers = { cookie: cookieHeader(cookies), origin: from };
    const body = ['GET', 'HEAD'].includes(method) ? undefined : '';
    const request = new NextRequest(url, { method, headers, body });
    Object.assign(asked, { cookies, headers: new Headers(headers) });
    const params = Promise.resolve(
      Object.fromEntries([...route.matchAll(/\[(?:\.\.\.)?([^\]]+)\]/g)].map((m) => [m[1], pathOf(m[0])])),
    );
    return (await handler(request, { params })) as Response;
  }

  test.each(guarded(surface.handlers))('%s: %s', async (key, access) => {
    await expectTable(access, async (cookies) => {
      try {
        return decisions[(await answer(key, cookies, origin)).status] ?? 'allowed';
      } catch {
        return 'allowed';
      }
    });
    if (/^(GET|HEAD) /.test(key)) return;
    for (const { cookies } of visitors)
      expect(await (await answer(key, await cookies(), 'http://elsewhere.example')).json()).toMatchObject({
        code: 'wrong-origin',
      });
  });
});

describe('the proxy', () => {
  async function proxied(method: string, path: string, headers: Record<string, string>) {
    const { proxy } = await import('@/proxy');
    return proxy(new NextRequest(`${origin}${path}`, { method, headers: { origin, ...headers } }));
  }
  const decided = (response: Response): AccessDecision => {
    const to = response.headers.get('location') ?? '';
    if (response.status === 401 || to.includes('/sign-in')) return 'sign-in';
    return response.status === 403 || to.endsWith('/not-allowed') ? 'not-allowed' : 'allowed';
  };

  test.each(Object.entries(surface.pages))('guards the page %s: %s', async (route, access) => {
    await expectTable(access, async (cookies) =>
      decided(await proxied('GET', pathOf(route), { cookie: cookieHeader(cookies) })),
    );
  });

  test.each(Object.entries(surface.handlers))('guards %s: %s', async (key, access) => {
    const [method, route] = key.split(' ') as [string, string];
    await expectTable(access, async (cookies) =>
      decided(await proxied(method, pathOf(route), { cookie: cookieHeader(cookies) })),
    );
  });

  test('shows nothing that is not listed', async () => {
    const response = await proxied('GET', '/not-listed-anywhere', {});
    expect(response.status).toBe(404);
  });

  test.each(['POST', 'PUT', 'PATCH', 'DELETE'])('refuses %s from another site or without an origin', async (method) => {
    for (const from of ['http://elsewhere.example', 'null', '']) {
      const response = await proxied(method, '/sign-in', { origin: from });
      expect(response.status, from).toBe(403);
    }
  });
});
