import { expect, test } from '@playwright/test';
import { live } from './keeping';

for (const path of ['/', '/cases/junction', '/cases/junction/report'])
  test(`${path} works under the content policy: no script and no style is held back, nothing is complained of`, async ({
    page,
  }) => {
    const complaints: string[] = [];
    page.on('console', (message) => {
      if (message.type() === 'error') complaints.push(message.text());
    });
    page.on('pageerror', (error) => complaints.push(error.message));
    await page.addInitScript(() => {
      addEventListener('securitypolicyviolation', (event) => {
        console.error(`held back: ${event.violatedDirective} ${event.blockedURI}`);
      });
    });
    const response = await page.goto(path);
    await live(page);
    await page.waitForTimeout(1_000);
    const policy = response?.headers()['content-security-policy'] ?? '';
    expect(policy).toMatch(/script-src 'self' 'nonce-[^']+' 'strict-dynamic'/);
    expect(policy).toContain("object-src 'none'");
    expect(response?.headers()['x-content-type-options']).toBe('nosniff');
    expect(complaints).toEqual([]);
  });

test('a body of 50 MB is refused in words, and the server goes on', async ({ request }) => {
  const reply = await request.post('/api/cases', { data: Buffer.alloc(50 * 1024 * 1024, ' ') });
  expect(reply.status()).toBe(422);
  expect((await reply.json()).error[0].says).toContain('8 MiB');
  expect((await request.get('/api/health')).status()).toBe(200);
});

test('a page of another site may not write, and a foreign name is not answered', async ({ request }) => {
  const foreign = await request.post('/api/cases', { headers: { origin: 'https://example.org' }, data: {} });
  expect(foreign.status()).toBe(403);
  const named = await request.get('/', { headers: { host: 'example.org' } });
  expect(named.status()).toBe(403);
});
