import { eq, isNull } from 'drizzle-orm';
import type { Db } from '../db/connect.ts';
import { siteState } from '../db/schema/mail.ts';
import { users } from '../db/schema/people.ts';
import type { Deps } from '../deps.ts';
import { enqueueMail } from '../mail/enqueue-mail.ts';
import { storageLow } from '../mail/letters.ts';
import { type Room, readRoom, toMegabytes } from './room.ts';

const key = 'storage.low-since';

/** Tells the admins once when the reserve is touched; again only after there was room in between. */
export async function watchRoom(
  { db, config }: Pick<Deps, 'db' | 'config'>,
  now = new Date(),
  read: () => Promise<Room> = () => readRoom(config),
): Promise<void> {
  const { freeBytes, belowReserve } = await read();
  db.transaction(
    (tx) => {
      const told = tx.select().from(siteState).where(eq(siteState.key, key)).get();
      // A fifth above the reserve counts as room again: a value that hovers must not fill a mailbox.
      if (told && freeBytes > config.freeSpaceReserveBytes * 1.2) tx.delete(siteState).where(eq(siteState.key, key)).run();
      if (told || !belowReserve) return;
      tx.insert(siteState).values({ key, value: { freeBytes }, at: now.toISOString() }).run();
      const letter = storageLow(toMegabytes(freeBytes), toMegabytes(config.freeSpaceReserveBytes), `${config.siteUrl}/admin/health`);
      for (const admin of admins(db)) enqueueMail(tx, admin.email, letter, { now });
    },
    { behavior: 'immediate' },
  );
}

const admins = (db: Db) =>
  db
    .select()
    .from(users)
    .where(isNull(users.disabledAt))
    .all()
    .filter(({ roles }) => roles.includes('admin'));
