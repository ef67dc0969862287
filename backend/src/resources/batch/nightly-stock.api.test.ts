import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { eq } from 'drizzle-orm';
import { expect, onTestFinished, test } from 'vitest';
import { nightlyRun, packages } from '../../../../openapi/examples/nightly-stock.ts';
import { type TestApp, testApp } from '../../../../tests/support/test-app.ts';
import { createApp } from '../../app.ts';
import { hulls } from '../../db/schema/catalog.ts';
import { usage } from '../../db/schema/limits.ts';

async function listening({ deps }: TestApp): Promise<string> {
  const server: Server = createApp(deps).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  onTestFinished(() => void server.close());
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}

/** A stock list as shops keep it: maker, model and year in this or that order, in capitals, with what else is on the card. */
function stockNames(app: TestApp, count: number): string[] {
  const rows = app.db.select().from(hulls).where(eq(hulls.generic, false)).all();
  const write = [
    (maker: string, model: string, year: number) => `${year} ${maker} ${model}`,
    (maker: string, model: string, year: number) => `${maker.toUpperCase()} ${model.toUpperCase()} ${year}`,
    (maker: string, model: string, year: number) => `${maker} ${model.replace(/\s+/g, '')} (${year})`,
    (maker: string, model: string, year: number) => `${model}, ${maker}, model year ${year}, on trailer`,
  ];
  return Array.from({ length: count }, (_, n) => {
    const { maker, model, package: pack, yearFrom, yearTo } = rows[n % rows.length]!;
    const year = Math.min(yearTo ?? 2024, (yearFrom ?? 2010) + (n % 3));
    return write[Math.floor(n / rows.length) % write.length]!(maker, pack ? `${model} ${pack}` : model, year);
  });
}

test('a thousand boats of a stock list: resolved, asked in one batch, and skipped the next night', { timeout: 300_000 }, async () => {
  const app = testApp();
  const site = await listening(app);
  const integrator = await app.as('integrator');
  const { key, id } = (
    await integrator
      .post('/api/v1/me/keys')
      .send({ name: 'Night', scopes: ['catalog:read', 'fit:compute'] })
      .expect(201)
  ).body;
  const names = stockNames(app, 1000);
  expect(names).toHaveLength(1000);

  const first = await nightlyRun(site, key, names, packages, {});
  // Of the thousand, hardly one is left to a person, and no line fails.
  expect(first.unresolved.length, JSON.stringify(first.unresolved.slice(0, 5))).toBeLessThanOrEqual(20);
  expect(first.problems).toEqual([]);
  expect(first.changed.length).toBe(Object.keys(first.digests).length);
  expect(first.changed.length).toBeGreaterThan(100);

  const second = await nightlyRun(site, key, names, packages, first.digests);
  expect(second.changed).toEqual([]);
  expect(second.unchanged).toBe(first.changed.length);
  expect(second.digests).toEqual(first.digests);

  // Two nights of two requests each, counted to the unit.
  const [day] = (await integrator.get('/api/v1/me/usage').expect(200)).body.data;
  expect(day).toMatchObject({ key: id, requests: 4 });
  expect(app.db.select().from(usage).all()[0]!.units).toBe(day.units);

  // One hull's figure changes: only its answers are news.
  const [some] = Object.keys(first.digests);
  const hull = some!.split(' ')[0]!;
  app.db.update(hulls).set({ transomAngleDeg: 3, deadriseDeg: 1, edition: 1 }).where(eq(hulls.id, hull)).run();
  const later = await nightlyRun(await listening(app.again()), key, names, packages, first.digests);
  expect(later.changed.length).toBeGreaterThan(0);
  expect(new Set(later.changed.map(({ answer }) => answer.ref!.split(' ')[0]))).toEqual(new Set([hull]));
});
