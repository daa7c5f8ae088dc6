/**
 * Takes the pictures of the README from a running product with demo data:
 * `SLANTWISE_DEMO_PASSWORD=... node scripts/readme-pictures.mjs http://127.0.0.1:4600`.
 */
import { mkdirSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';

const address = process.argv[2] ?? 'http://127.0.0.1:4600';
const password = process.env.SLANTWISE_DEMO_PASSWORD;
if (!password) throw new Error('Set SLANTWISE_DEMO_PASSWORD to the password that the start printed.');
const root = fileURLToPath(new URL('..', import.meta.url));
const folder = join(root, 'scripts/readme-pictures');
const flags = ['--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'];

async function signedIn(browser, who) {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, colorScheme: 'light' });
  const page = await context.newPage();
  await page.goto(`${address}/sign-in`);
  await page.fill('input[name=email]', `${who}@merrow.example`);
  await page.fill('input[name=password]', password);
  await page.click('button[type=submit]');
  await page.waitForURL('**/projects');
  return page;
}

async function shoot(page, name, path) {
  if (path) await page.goto(`${address}${path}`);
  await page.waitForLoadState('networkidle');
  // The last frame of a drawing comes after the last answer.
  await page.waitForTimeout(1500);
  await page.screenshot({ path: join(folder, `${name}.png`) });
}

mkdirSync(folder, { recursive: true });
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: flags });
try {
  const page = await signedIn(browser, 'designer');
  await shoot(page, 'projects', '/projects');
  const read = (path) => page.evaluate(async (from) => (await fetch(from)).json(), path);
  const { items } = await read('/api/projects');
  const panel = items.flatMap(({ panels }) => panels).find(({ name }) => name.startsWith('A,'));
  for (const sheet of ['requirement', 'illumination', 'cells', 'phase', 'pattern']) await shoot(page, sheet, `/panels/${panel.id}/${sheet}`);
  const revisions = (await read(`/api/panels/${panel.id}/revisions`)).items;
  const reference = (number) => `revision:${revisions.find((one) => one.number === number).id}`;
  await shoot(page, 'compare', `/panels/${panel.id}/revisions/compare?before=${reference(3)}&after=${reference(4)}`);
  const lab = await signedIn(browser, 'lab');
  await lab.goto(`${address}/library/import`);
  const cells = join(root, 'cell-library/square-patch-15-laboratory');
  const files = readdirSync(cells).filter((name) => /\.(s1p|csv|json)$/.test(name) && name !== 'faults.csv');
  await lab.setInputFiles('input[type=file]', files.map((name) => join(cells, name)));
  await lab.getByRole('button', { name: 'Check the cells' }).click({ timeout: 30_000 });
  await lab.getByRole('region', { name: 'Checks' }).waitFor({ timeout: 30_000 });
  await lab.getByRole('region', { name: 'Checks' }).scrollIntoViewIfNeeded();
  await shoot(lab, 'import');
} finally {
  await browser.close();
}
