import type { APIRequestContext, Browser, BrowserContext } from '@playwright/test';
import { request } from '@playwright/test';

export const DEMO_PASSWORD = 'strike the slab';
export const PEOPLE = {
  owner: 'ruth@bluestem.example',
  bookkeeper: 'dana@bluestem.example',
  foreman: 'luis@bluestem.example',
} as const;
export type Person = keyof typeof PEOPLE;

export const originOf = (baseURL: string | undefined) => new URL(baseURL ?? '').origin;

/** Requests as a browser's page of ours would send them. */
export async function requestsOf(baseURL: string | undefined): Promise<APIRequestContext> {
  const origin = originOf(baseURL);
  return request.newContext({ baseURL: origin, extraHTTPHeaders: { origin } });
}

export async function signedIn(
  baseURL: string | undefined,
  person: Person,
): Promise<APIRequestContext> {
  const context = await requestsOf(baseURL);
  const answer = await context.post('/api/sign-in', {
    data: { email: PEOPLE[person], password: DEMO_PASSWORD },
  });
  if (!answer.ok()) throw new Error(`${person} could not sign in: ${await answer.text()}`);
  return context;
}

/** A browser window in which `person` has signed in. */
export async function windowOf(
  browser: Browser,
  baseURL: string | undefined,
  person: Person,
  options: Parameters<Browser['newContext']>[0] = {},
): Promise<BrowserContext> {
  const requests = await signedIn(baseURL, person);
  const storageState = await requests.storageState();
  await requests.dispose();
  return browser.newContext({ baseURL: originOf(baseURL), ...options, storageState });
}
