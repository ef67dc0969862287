// Ways out of an import that leave the catalog as it is.
import { rm } from 'node:fs/promises';
import path from 'node:path';
import type { Config } from '../../config.ts';
import type { Db } from '../../db/connect.ts';
import { ApiProblem } from '../../errors.ts';
import { audit } from '../audit.ts';
import { importOrProblem, setImport } from './queries.ts';

/** The check notices between two batches. @throws ApiProblem wrong-state */
export function cancelCheck(db: Db, id: string, actor: string): void {
  db.transaction(
    (tx) => {
      const { status, mapping, needsMapping } = importOrProblem(db, id);
      if (status !== 'checking')
        throw new ApiProblem('wrong-state', `Nothing is under way that could be stopped: the import is ${status}.`);
      setImport(tx, id, { status: mapping && !needsMapping ? 'mapped' : 'uploaded', checkedRows: 0, counts: null });
      audit(tx, actor, 'import.cancel', id);
    },
    { behavior: 'immediate' },
  );
}

/** The file goes from the disk; a check under way stops. @throws ApiProblem wrong-state */
export async function discardImport(
  { db, config }: { db: Db; config: Pick<Config, 'uploadsFolder'> },
  id: string,
  actor: string,
): Promise<void> {
  const record = importOrProblem(db, id);
  if (record.status === 'discarded') return;
  if (record.status === 'published') throw new ApiProblem('wrong-state', 'A published import stays; roll its edition back instead.');
  if (record.status === 'publishing') throw new ApiProblem('wrong-state', 'The import is being published at this moment.');
  db.transaction(
    (tx) => {
      setImport(tx, id, { status: 'discarded' });
      audit(tx, actor, 'import.discard', id);
    },
    { behavior: 'immediate' },
  );
  await rm(path.join(config.uploadsFolder, record.storedAs), { force: true });
}
