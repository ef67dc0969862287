// Pictures of every page at phone and desk size, light and dark, to be looked at:
//   npm run screens -- <folder> [address]
// Without an address a server of its own is started on an empty data folder.
import { spawn } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { type Browser, chromium, type Page } from '@playwright/test';

const folder = path.resolve(process.argv[2] ?? 'test-results/screens');
const own = 4391;
const address = process.argv[3] ?? `http://127.0.0.1:${own}`;
const sizes = { phone: { width: 360, height: 740 }, desk: { width: 1280, height: 860 } };
const themes = ['light', 'dark'] as const;
const password = 'loft-floor-2026';

interface Screen {
  name: string;
  as?: 'customer' | 'integrator' | 'steward' | 'admin';
  open: (page: Page) => Promise<unknown>;
}

const idOf = async (page: Page, query: string): Promise<string> => {
  const answer = await page.request.get(`${address}/api/v1/${query}`);
  return ((await answer.json()) as { data: { id: string }[] }).data[0]!.id;
};
const go = (at: string) => (page: Page) => page.goto(`${address}${at}`);
const sheet = (kind: string, query: string) => async (page: Page) =>
  page.goto(`${address}/${kind}/${await idOf(page, `${kind}?${query}`)}`);

async function storyFit(page: Page, index: number) {
  await page.goto(address);
  await page
    .getByRole('link', { name: /story|check|Tansy|Bellwether|Duckboard/i })
    .nth(index)
    .click();
}

async function asked(page: Page) {
  await page.goto(`${address}/sign-up`);
  await page.getByLabel('Name').fill('A newcomer');
  await page.getByLabel('E-mail address').fill('newcomer@tiltwright.example');
  await page.getByLabel('Password').fill('twelve or more');
  await page.getByRole('button', { name: 'Make an account' }).click();
  await page.getByRole('link', { name: 'Read the mail' }).waitFor();
}

async function uploaded(page: Page) {
  const table = 'maker,model,form,length_m,deadrise_deg\nAlderwick,Moorhen 46,modified-v,4.6,17\nAlderwick,Moorhen 60,modified-v,6,steep\n';
  const created = await page.request.post(`${address}/api/v1/imports`, {
    multipart: { table: 'hulls', file: { name: 'alderwick.csv', mimeType: 'text/csv', buffer: Buffer.from(table) } },
  });
  const { id } = (await created.json()) as { id: string };
  await page.request.post(`${address}/api/v1/imports/${id}/check`);
  await page.goto(`${address}/steward/imports/${id}`);
}

const screens: Screen[] = [
  { name: 'home', open: go('/') },
  {
    name: 'home-search',
    open: async (page) => {
      await page.goto(address);
      await page.getByRole('searchbox').or(page.getByRole('combobox')).first().fill('redcuter');
    },
  },
  {
    name: 'home-nothing',
    open: async (page) => {
      await page.goto(address);
      await page.getByRole('searchbox').or(page.getByRole('combobox')).first().fill('xqzzkv');
    },
  },
  { name: 'home-customer', as: 'customer', open: go('/') },
  { name: 'hull', open: sheet('hulls', 'q=reedcutter 14') },
  { name: 'hull-generic', open: sheet('hulls', 'q=generic flat&generic=true') },
  { name: 'hull-missing', open: go('/hulls/hul_nothing') },
  { name: 'lower-unit', open: sheet('lower-units', 'generic=false') },
  { name: 'transducer', open: sheet('transducers', 'generic=false') },
  { name: 'mount', open: sheet('mounts', 'generic=false') },
  { name: 'fit-empty', open: go('/fit') },
  { name: 'fit-hull', open: async (page) => page.goto(`${address}/fit?hull=${await idOf(page, 'hulls?q=reedcutter 14')}`) },
  { name: 'fit-story', as: 'customer', open: (page) => storyFit(page, 0) },
  { name: 'fit-twins', as: 'customer', open: (page) => storyFit(page, 1) },
  { name: 'sign-in', open: go('/sign-in') },
  { name: 'sign-up', open: go('/sign-up') },
  { name: 'sign-up-asked', open: asked },
  {
    name: 'outbox',
    open: async (page) => {
      await asked(page);
      await page.getByRole('link', { name: 'Read the mail' }).click();
    },
  },
  { name: 'reset', open: go('/reset') },
  { name: 'link-not-whole', open: go('/verify') },
  { name: 'account', as: 'customer', open: go('/account') },
  { name: 'admin-people', as: 'admin', open: go('/admin') },
  {
    name: 'admin-person',
    as: 'admin',
    open: async (page) => page.goto(`${address}/admin/people/${await idOf(page, 'users?q=customer')}`),
  },
  { name: 'admin-invitations', as: 'admin', open: go('/admin/invitations') },
  { name: 'admin-limits', as: 'admin', open: go('/admin/limits') },
  { name: 'admin-audit', as: 'admin', open: go('/admin/audit') },
  { name: 'admin-mail', as: 'admin', open: go('/admin/mail') },
  { name: 'admin-health', as: 'admin', open: go('/admin/health') },
  { name: 'steward-visitor', open: go('/steward') },
  { name: 'steward-customer', as: 'customer', open: go('/steward') },
  { name: 'steward', as: 'steward', open: go('/steward') },
  { name: 'steward-import', as: 'steward', open: uploaded },
  { name: 'not-found', open: go('/no/such/page') },
];

async function takeAll(browser: Browser) {
  const only = process.env.ONLY?.split(',');
  for (const { name, as, open } of screens.filter((screen) => !only || only.includes(screen.name))) {
    for (const [size, viewport] of Object.entries(sizes)) {
      for (const colorScheme of themes) {
        const context = await browser.newContext({ viewport, colorScheme, hasTouch: size === 'phone' });
        const page = await context.newPage();
        if (as) await page.request.post(`${address}/api/v1/session`, { data: { email: `${as}@tiltwright.example`, password } });
        await open(page).catch((error: Error) => process.stderr.write(`${name}: ${error.message.split('\n')[0]}\n`));
        await page.waitForLoadState('networkidle');
        await page.waitForTimeout(400);
        const sideways = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
        if (sideways > 0) process.stderr.write(`${name} ${size}: scrolls ${sideways} px sideways\n`);
        await page.screenshot({ path: path.join(folder, `${name}-${size}-${colorScheme}.png`), fullPage: true });
        await context.close();
      }
    }
  }
}

async function main() {
  mkdirSync(folder, { recursive: true });
  const server = process.argv[3]
    ? undefined
    : spawn(process.execPath, [path.join(import.meta.dirname, 'serve-fresh.mjs')], {
        env: { ...process.env, PORT: String(own) },
        stdio: 'ignore',
      });
  try {
    for (
      let tries = 0;
      tries < 100 &&
      !(await fetch(`${address}/readyz`).then(
        (r) => r.ok,
        () => false,
      ));
      tries++
    )
      await new Promise((resolve) => setTimeout(resolve, 200));
    const browser = await chromium.launch({
      executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    });
    await takeAll(browser);
    await browser.close();
  } finally {
    server?.kill('SIGTERM');
  }
}

await main();
