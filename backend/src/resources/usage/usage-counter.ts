// Counts what keys ask for. Kept in memory and written in a lump: a durable write a request would cost more than most answers.
import { and, eq, sql } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { usage } from '../../db/schema/limits.ts';

/** What a sudden end of the process loses of the count, at most. */
export const flushEveryMs = 5000;

interface Count {
  keyId: string;
  day: string;
  requests: number;
  units: number;
  refused: number;
}

export interface UsageCounter {
  /** Adds units to a key's day; `requests` 0 for the lines of a batch, which are one request. */
  note(keyId: string, units: number, outcome: 'served' | 'refused', requests?: number): void;
  /** Units a key has used since midnight UTC. */
  unitsToday(keyId: string): number;
  /** Writes what was counted. */
  flush(): void;
}

export const dayOf = (date: Date) => date.toISOString().slice(0, 10);

export function usageCounter(db: Db, now: () => Date = () => new Date()): UsageCounter {
  let pending = new Map<string, Count>();
  /** Units of the current day, written ones included. */
  let today = { day: dayOf(now()), units: new Map<string, number>() };

  const unitsWritten = (keyId: string, day: string) =>
    db
      .select({ units: usage.units })
      .from(usage)
      .where(and(eq(usage.keyId, keyId), eq(usage.day, day)))
      .get()?.units ?? 0;

  const unitsToday = (keyId: string): number => {
    const day = dayOf(now());
    if (today.day !== day) today = { day, units: new Map() };
    let units = today.units.get(keyId);
    if (units === undefined) {
      units = unitsWritten(keyId, day) + (pending.get(`${keyId} ${day}`)?.units ?? 0);
      today.units.set(keyId, units);
    }
    return units;
  };

  return {
    note(keyId, units, outcome, requests = 1) {
      const before = unitsToday(keyId);
      today.units.set(keyId, before + units);
      const place = `${keyId} ${today.day}`;
      const count = pending.get(place) ?? { keyId, day: today.day, requests: 0, units: 0, refused: 0 };
      count.requests += requests;
      count.units += units;
      if (outcome === 'refused') count.refused += 1;
      pending.set(place, count);
    },
    unitsToday,
    flush() {
      if (pending.size === 0) return;
      const counts = [...pending.values()];
      pending = new Map();
      db.transaction(
        (tx) => {
          for (const count of counts) {
            tx.insert(usage)
              .values(count)
              .onConflictDoUpdate({
                target: [usage.keyId, usage.day],
                set: {
                  requests: sql`${usage.requests} + ${count.requests}`,
                  units: sql`${usage.units} + ${count.units}`,
                  refused: sql`${usage.refused} + ${count.refused}`,
                },
              })
              .run();
          }
        },
        { behavior: 'immediate' },
      );
    },
  };
}
