import { Health } from '@tiltwright/shared/schemas/desk.ts';
import type { Deps } from '../../deps.ts';
import { noStore, type Route, route } from '../../http/operation.ts';
import { readHealth } from './read-health.ts';

/** Counting bytes reads the whole database once: an admin who reloads gets the same figures for a while. */
const keptMs = 30_000;

export function healthRoutes(deps: Deps): Route[] {
  const startedAt = new Date();
  let kept: { until: number; health: Promise<Health> } | undefined;
  return [
    route(
      {
        id: 'getHealth',
        method: 'get',
        path: '/health',
        tag: 'Administration',
        summary: 'How the site is: room, mails, people, what takes the bytes',
        description: 'Figures are at most half a minute old. For a machine that only asks whether the site is up there is `/healthz`.',
        may: 'site.run',
        reply: { status: 200, description: 'The figures.', schema: Health },
        cache: noStore,
      },
      () => {
        if (!kept || kept.until < Date.now()) kept = { until: Date.now() + keptMs, health: readHealth(deps, startedAt) };
        return kept.health;
      },
    ),
  ];
}
