import { eq } from 'drizzle-orm';
import type { Db } from '../../db/connect.ts';
import { imports } from '../../db/schema/imports.ts';
import type { ImportJobs } from '../../jobs/import-jobs.ts';

/**
 * After a stop in the middle: a check goes on behind the last batch it kept, and a publication, being one transaction,
 * either happened or did not. The checks run on behind this call.
 */
export function recoverImports(db: Db, jobs: ImportJobs, report: (error: unknown) => void): void {
  db.update(imports).set({ status: 'checked' }).where(eq(imports.status, 'publishing')).run();
  const checking = db.select({ id: imports.id }).from(imports).where(eq(imports.status, 'checking')).all();
  for (const { id } of checking) jobs.run({ kind: 'check', id }).catch(report);
}
