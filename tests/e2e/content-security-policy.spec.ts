import { expect, test } from '@playwright/test';
import { routes } from '../../lib/routes';

/** Pages that need no record of their own. */
const PAGES = [
  routes.pourDay(),
  routes.jobs(),
  routes.orders(),
  routes.tickets(),
  routes.suppliers(),
  routes.statements(),
  routes.variances(),
  routes.yield(),
  routes.company(),
  routes.people(),
  routes.outbox(),
  routes.activity(),
  routes.accessKeys(),
  routes.account(),
];

test('no page does what its content security policy forbids, and no script fails', async ({
  page,
  baseURL,
}) => {
  const wrong: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error') wrong.push(`${page.url()}: ${message.text()}`);
  });
  page.on('pageerror', (error) => wrong.push(`${page.url()}: ${error.message}`));
  const visit = async (path: string) => {
    const answer = await page.goto(path);
    // Whatever a page does once it is loaded; one that keeps asking never falls silent.
    await page.waitForLoadState('networkidle', { timeout: 3000 }).catch(() => undefined);
    expect(`${path} ${answer?.status()}`).toBe(`${path} 200`);
  };
  for (const path of [routes.signIn(), routes.signUp(), routes.forgotPassword()]) await visit(path);
  const signedIn = await page.request.post('/api/sign-in', {
    headers: { origin: new URL(baseURL ?? '').origin },
    data: { email: 'ruth@bluestem.example', password: 'strike the slab' },
  });
  expect(signedIn.ok()).toBe(true);
  for (const path of PAGES) await visit(path);
  expect(wrong).toEqual([]);
});

test('a handler written into the page, as an injected text would be, does not run', async ({
  page,
}) => {
  await page.goto(routes.signIn());
  const blocked = await page.evaluate(
    () =>
      new Promise<string>((resolve) => {
        document.addEventListener('securitypolicyviolation', (event) => {
          resolve(`${event.violatedDirective} ${window.name}`);
        });
        const holder = document.createElement('div');
        holder.innerHTML = `<img src="/nothing" onerror="window.name = 'it ran'">`;
        document.body.append(holder);
      }),
  );
  expect(blocked).toBe('script-src-attr ');
});
