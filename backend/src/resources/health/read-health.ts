import { readdir, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Health } from '@tiltwright/shared/schemas/desk.ts';
import { and, count, eq, gt, isNotNull, min } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { mailOutbox, siteState } from '../../db/schema/mail.ts';
import { sessions, users } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { readRoom, toMegabytes } from '../../storage/room.ts';
import { currentEdition } from '../catalog/queries.ts';
import { tidiedKey } from '../retention/tidy.ts';

type Needs = Pick<Deps, 'db' | 'config'>;

/** Which tables a kind of data lies in; whatever is new and not named here is counted as "other". */
const kinds: readonly [kind: string, tables: RegExp][] = [
  ['catalog', /^(hulls|lower_units|transducers|mounts|trim_points|makers|aliases|sources)(_|$)/],
  ['history', /^(revisions|editions|outbox)(_|$)/],
  ['search', /^search_/],
  ['imports', /^(imports|import_rows|mappings|drafts?)(_|$)/],
  [
    'people',
    /^(users|profiles|sessions|boats|rigs|saved_fits|fits|trials|corrections|shares|sign_ups|password_resets|invitations|second_factors|recovery_codes)(_|$)/,
  ],
  ['keys and webhooks', /^(api_keys|usage|limits|webhooks|deliveries|idempotency|jobs)(_|$)/],
  ['mail', /^mail_/],
  ['audit', /^audit_/],
];

/** How the site is: what an admin looks after, with what takes the room. */
export async function readHealth({ db, config }: Needs, startedAt: Date, now = new Date()): Promise<Health> {
  const room = await readRoom(config);
  const mails = mailCounts(db);
  const last = db.select().from(siteState).where(eq(siteState.key, tidiedKey)).get();
  const remarks = [
    room.belowReserve && `Only ${toMegabytes(room.freeBytes)} MB are free: uploads and imports are refused.`,
    !room.belowReserve &&
      room.freeBytes < 3 * config.freeSpaceReserveBytes &&
      `Room gets short: ${toMegabytes(room.freeBytes)} MB are free.`,
    mails.failed > 0 && `${mails.failed} ${mails.failed === 1 ? 'mail' : 'mails'} could not be sent.`,
    config.smtpUrl === null && config.mode === 'production' && 'No mail server is set: mails stay in the outbox of the data folder.',
  ].filter((remark) => remark !== false);
  return {
    status: room.belowReserve || mails.failed > 0 ? 'bad' : remarks.length > 0 ? 'care' : 'good',
    remarks,
    startedAt: startedAt.toISOString(),
    edition: currentEdition(db),
    disk: { ...room, reserveBytes: config.freeSpaceReserveBytes },
    bytes: (await bytesByKind({ db, config })).sort((a, b) => b.bytes - a.bytes),
    memoryBytes: process.memoryUsage.rss(),
    mails: { ...mails, leaves: config.smtpUrl !== null },
    people: {
      accounts: countOf(db.select({ n: count() }).from(users).get()),
      disabled: countOf(db.select({ n: count() }).from(users).where(isNotNull(users.disabledAt)).get()),
      sessions: countOf(
        db
          .select({ n: count() })
          .from(sessions)
          .where(and(isNotNull(sessions.userId), gt(sessions.expiresAt, now.getTime())))
          .get(),
      ),
    },
    lastTidied: last ? { at: last.at, removed: last.value as Record<string, number> } : null,
  };
}

const countOf = (row: { n: number } | undefined) => row?.n ?? 0;

function mailCounts(db: Db) {
  const queued = db
    .select({ n: count(), oldest: min(mailOutbox.createdAt) })
    .from(mailOutbox)
    .where(eq(mailOutbox.status, 'queued'))
    .get();
  const failed = db.select({ n: count() }).from(mailOutbox).where(eq(mailOutbox.status, 'failed')).get();
  return { queued: queued?.n ?? 0, failed: failed?.n ?? 0, oldestQueuedAt: queued?.oldest ?? null };
}

async function bytesByKind({ db, config }: Needs): Promise<Health['bytes']> {
  const pages = db.$client
    .prepare(
      // An index counts with its table.
      `SELECT coalesce(s.tbl_name, d.name) AS name, d.pgsize AS bytes
       FROM (SELECT name, sum(pgsize) AS pgsize FROM dbstat WHERE aggregate = TRUE GROUP BY name) d
       LEFT JOIN sqlite_master s ON s.name = d.name`,
    )
    .all() as { name: string; bytes: number }[];
  const totals = new Map<string, number>();
  for (const { name, bytes } of pages) {
    const kind = kinds.find(([, tables]) => tables.test(name))?.[0] ?? 'other';
    totals.set(kind, (totals.get(kind) ?? 0) + bytes);
  }
  const files: [kind: string, folder: string][] = [
    ['uploaded files', config.uploadsFolder],
    ['outbox files', config.outboxFolder],
  ];
  for (const [kind, folder] of files) totals.set(kind, await folderBytes(folder));
  return [...totals].map(([kind, bytes]) => ({ kind, bytes }));
}

async function folderBytes(folder: string): Promise<number> {
  let bytes = 0;
  for (const name of await readdir(folder)) {
    // A file may go while it is counted.
    bytes += (await stat(path.join(folder, name)).catch(() => null))?.size ?? 0;
  }
  return bytes;
}
