// How much a caller may ask: units a minute, and for keys a day. A request is let in while any unit is left and charged
// in full, so that one dear question can always be asked once; what it takes beyond the minute is not carried over.
import { isIPv6 } from 'node:net';
import type { LimitedCaller } from '@tiltwright/shared/schemas/limit.ts';
import type { Request, Response } from 'express';
import { RateLimiterMemory } from 'rate-limiter-flexible';
import type { Actor } from '../auth/actor.ts';
import type { Config } from '../config.ts';
import type { Db } from '../db/connect.ts';
import { limits as limitsTable } from '../db/schema/limits.ts';
import { ApiProblem } from '../errors.ts';
import type { UsageCounter } from '../resources/usage/usage-counter.ts';

interface Allowance {
  unitsPerMinute: number;
  unitsPerDay: number | null;
}

export interface Limits {
  /**
   * Charges a request before it is worked on and says in its headers what is left.
   * @throws ApiProblem too-many-requests with Retry-After
   */
  charge(req: Request, res: Response, actor: Actor, units: number): Promise<void>;
  /** Charges more for a request that has been let in: its lines, or the dearer kind of answer. */
  chargeMore(req: Request, actor: Actor, units: number): Promise<void>;
  /** Reads the admin's changes. */
  reload(): void;
  current(): Readonly<Record<LimitedCaller, Allowance>>;
}

const minuteSeconds = 60;

export function createLimits(db: Db, config: Config, usage: UsageCounter): Limits {
  let allowances = readAllowances(db, config);
  // points is unused: whether units are left is asked of the count itself, so that a change holds at once.
  const counts = new RateLimiterMemory({ points: 1, duration: minuteSeconds });

  const refuse = (res: Response, detail: string, seconds: number): never => {
    throw new ApiProblem('too-many-requests', detail, [], {
      'Retry-After': String(seconds),
      ...Object.fromEntries(['RateLimit', 'RateLimit-Policy'].map((name) => [name, String(res.getHeader(name))])),
    });
  };

  return {
    async charge(req, res, actor, units) {
      if (units === 0) return;
      const { caller, name } = callerOf(req, actor);
      const { unitsPerMinute, unitsPerDay } = allowances[caller];
      const before = await counts.get(name);
      const used = before?.consumedPoints ?? 0;
      const usedToday = actor.kind === 'key' ? usage.unitsToday(actor.keyId) : 0;
      const dayIsOver = unitsPerDay !== null && usedToday >= unitsPerDay;
      const refused = dayIsOver || used >= unitsPerMinute;
      if (!refused) await counts.penalty(name, units);
      const seconds = Math.max(1, Math.ceil((before?.msBeforeNext ?? minuteSeconds * 1000) / 1000));
      const left = Math.max(0, unitsPerMinute - used - (refused ? 0 : units));
      const policies = [`"${caller}";q=${unitsPerMinute};w=${minuteSeconds}`];
      const standings = [`"${caller}";r=${left};t=${seconds}`];
      if (unitsPerDay !== null) {
        policies.push(`"${caller}-day";q=${unitsPerDay};w=86400`);
        standings.push(
          `"${caller}-day";r=${Math.max(0, unitsPerDay - usedToday - (refused ? 0 : units))};t=${secondsToMidnight(new Date())}`,
        );
      }
      res.setHeader('RateLimit-Policy', policies.join(', '));
      res.setHeader('RateLimit', standings.join(', '));
      if (actor.kind === 'key') usage.note(actor.keyId, refused ? 0 : units, refused ? 'refused' : 'served');
      if (dayIsOver)
        refuse(res, `The ${unitsPerDay} units of this day are used up; midnight UTC brings new ones.`, secondsToMidnight(new Date()));
      if (refused) refuse(res, `The ${unitsPerMinute} units of this minute are used up; wait ${seconds} seconds.`, seconds);
    },
    async chargeMore(req, actor, units) {
      if (units <= 0) return;
      await counts.penalty(callerOf(req, actor).name, units);
      if (actor.kind === 'key') usage.note(actor.keyId, units, 'served', 0);
    },
    reload() {
      allowances = readAllowances(db, config);
    },
    current: () => allowances,
  };
}

function readAllowances(db: Db, config: Config): Record<LimitedCaller, Allowance> {
  const { anonymous, page, account, key, keyDay } = config.limits;
  const allowances: Record<LimitedCaller, Allowance> = {
    anonymous: { unitsPerMinute: anonymous, unitsPerDay: null },
    page: { unitsPerMinute: page, unitsPerDay: null },
    account: { unitsPerMinute: account, unitsPerDay: null },
    key: { unitsPerMinute: key, unitsPerDay: keyDay },
  };
  for (const { caller, unitsPerMinute, unitsPerDay } of db.select().from(limitsTable).all())
    allowances[caller] = { unitsPerMinute, unitsPerDay: caller === 'key' ? unitsPerDay : null };
  return allowances;
}

/** Whose count a request goes on. */
function callerOf(req: Request, actor: Actor): { caller: LimitedCaller; name: string } {
  if (actor.kind === 'key') return { caller: 'key', name: actor.keyId };
  // Browsers say so of themselves, and pages cannot say it falsely. A program can, and then has a page's limit, no more.
  const caller = req.headers['sec-fetch-site'] === 'same-origin' ? 'page' : actor.kind === 'person' ? 'account' : 'anonymous';
  return { caller, name: `${caller} ${actor.kind === 'person' ? actor.userId : networkOf(req.ip ?? '')}` };
}

/** One count a household: an IPv6 line has its whole /64, an IPv4 address is one, however it is written. */
export function networkOf(address: string): string {
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address);
  if (mapped) return mapped[1]!;
  if (!isIPv6(address)) return address;
  const [head = '', tail] = address.split('%')[0]!.split('::');
  const front = head === '' ? [] : head.split(':');
  const back = tail === undefined || tail === '' ? [] : tail.split(':');
  const groups = tail === undefined ? front : [...front, ...Array<string>(8 - front.length - back.length).fill('0'), ...back];
  return groups
    .slice(0, 4)
    .map((group) => Number.parseInt(group, 16).toString(16))
    .join(':');
}

const secondsToMidnight = (now: Date) =>
  Math.ceil((Date.UTC(now.getUTCFullYear(), now.getUTCMonth(), now.getUTCDate() + 1) - now.getTime()) / 1000);
