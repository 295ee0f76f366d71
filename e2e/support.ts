// What the browser tests share: people who sign up by themselves, their mail, the look-out for accessibility faults.
import { randomInt, randomUUID } from 'node:crypto';
import AxeBuilder from '@axe-core/playwright';
import { test as base, expect, type APIRequestContext, type BrowserContext, type Page } from '@playwright/test';

export { expect };

export const PASSWORD = 'a-long-enough-password';

export interface Member {
  readonly name: string;
  readonly email: string;
  readonly page: Page;
}

/** An address for documentation (RFC 2544), so that no two tests share a rate limit. */
const ownAddress = (): string => `198.18.${randomInt(256)}.${randomInt(1, 255)}`;

interface Fixtures {
  /** A person with a confirmed account, signed in, in a browser of their own. */
  readonly enter: (name: string) => Promise<Member>;
}

export const test = base.extend<Fixtures>({
  // the runner wants a pattern for the first argument, even where nothing of it is used
  extraHTTPHeaders: async ({ baseURL: _ }, use) => {
    await use({ 'x-forwarded-for': ownAddress() });
  },
  enter: async ({ browser, baseURL }, use, info) => {
    const contexts: BrowserContext[] = [];
    await use(async (name) => {
      const { locale, viewport } = info.project.use;
      const context = await browser.newContext({
        ...(baseURL === undefined ? {} : { baseURL }),
        ...(locale === undefined ? {} : { locale }),
        ...(viewport === undefined ? {} : { viewport }),
        extraHTTPHeaders: { 'x-forwarded-for': ownAddress() },
      });
      contexts.push(context);
      const email = await openAccount(context.request, name);
      return { name, email, page: await context.newPage() };
    });
    for (const context of contexts) await context.close();
  },
});

export const newEmail = (name: string): string =>
  `${name.toLowerCase().replace(/[^a-z]+/g, '.')}.${randomUUID().slice(0, 8)}@shop.example`;

/** The link in the newest mail to an address. */
export async function linkInMail(request: APIRequestContext, email: string, subject: RegExp): Promise<string> {
  let link = '';
  await expect
    .poll(async () => {
      const mails = (await (await request.get(`/api/mail?to=${encodeURIComponent(email)}`)).json()) as {
        subject: string;
        text: string;
      }[];
      link = /https?:\S+/.exec(mails.find((mail) => subject.test(mail.subject))?.text ?? '')?.[0] ?? '';
      return link;
    })
    .not.toBe('');
  return link;
}

async function openAccount(request: APIRequestContext, name: string): Promise<string> {
  const email = newEmail(name);
  const made = await request.post('/api/auth/sign-up/email', { data: { name, email, password: PASSWORD } });
  expect(made.ok()).toBe(true);
  await request.get(await linkInMail(request, email, /Confirm/));
  return email;
}

/** A call of the API as the person on this page. */
export async function api<T>(page: Page, method: 'GET' | 'POST' | 'PUT', path: string, data?: unknown): Promise<T> {
  const answer = await page.request.fetch(`/api${path}`, { method, ...(data === undefined ? {} : { data }) });
  expect(answer.ok(), `${method} ${path}: ${answer.status()}`).toBe(true);
  return (await answer.json()) as T;
}

/** Neither a serious nor a critical fault, by axe's own measure. */
export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  const grave = violations.filter((v) => v.impact === 'serious' || v.impact === 'critical');
  expect(grave.map((v) => `${v.id}: ${v.nodes.map((n) => n.target.join(' ')).join(', ')}`)).toEqual([]);
}

/** Nothing is wider than the window. */
export async function expectNoSideways(page: Page): Promise<void> {
  const excess = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  expect(excess).toBe(0);
}

type Corner = readonly [number, number, number];

/** A binary STL of a closed box, in file units. */
export function boxStl(x: number, y: number, z: number): Buffer {
  const at = (i: number): Corner => [i & 1 ? x : 0, i & 2 ? y : 0, i & 4 ? z : 0];
  const faces = [
    [0, 2, 3, 1],
    [4, 5, 7, 6],
    [0, 1, 5, 4],
    [2, 6, 7, 3],
    [0, 4, 6, 2],
    [1, 3, 7, 5],
  ] as const;
  const triangles = faces.flatMap(([a, b, c, d]) => [
    [a, b, c],
    [a, c, d],
  ]);
  const bytes = Buffer.alloc(84 + 50 * triangles.length);
  bytes.writeUInt32LE(triangles.length, 80);
  triangles.forEach((triangle, t) => {
    triangle
      .flatMap((corner) => [...at(corner)])
      .forEach((value, k) => bytes.writeFloatLE(value, 84 + 50 * t + 12 + 4 * k));
  });
  return bytes;
}
