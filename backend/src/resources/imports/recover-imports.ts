import { eq, inArray } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { importRows, imports } from '../../db/schema/imports.ts';

/**
 * After a stop in the middle: a check begins again from the kept file, and publishing, being one transaction,
 * either happened or did not.
 */
export function recoverImports(db: Db): void {
  db.transaction(
    (tx) => {
      const checking = tx.select({ id: imports.id }).from(imports).where(eq(imports.status, 'checking')).all();
      tx.delete(importRows)
        .where(
          inArray(
            importRows.importId,
            checking.map(({ id }) => id),
          ),
        )
        .run();
      tx.update(imports).set({ status: 'uploaded', checkedRows: 0 }).where(eq(imports.status, 'checking')).run();
      tx.update(imports).set({ status: 'checked' }).where(eq(imports.status, 'publishing')).run();
    },
    { behavior: 'immediate' },
  );
}
