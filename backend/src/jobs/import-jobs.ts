// The heavy steps of an import, wherever they run: in a worker with its own connection, or in this process.
import type { TableOptions } from '@tiltwright/shared/csv/formats.ts';
import type { Table } from '@tiltwright/shared/schemas/catalog-record.ts';
import type { RolledBack } from '@tiltwright/shared/schemas/edition.ts';
import type { PublishOrder } from '@tiltwright/shared/schemas/import.ts';

/** What a look at an uploaded file tells. */
export interface Inspection {
  bytes: number;
  sha256: string;
  encoding: string;
  delimiter: string;
  decimalComma: boolean | null;
  rows: number;
  header: string[];
  headerRow: number;
  /** The header is in words of its own. */
  needsMapping: boolean;
  unknownColumns: string[];
}

export type ImportOrder =
  | { kind: 'inspect'; storedAs: string; table: Table; choices: Pick<TableOptions, 'headerRow' | 'encoding' | 'delimiter'> }
  | { kind: 'check'; id: string }
  | { kind: 'publish'; id: string; order: PublishOrder; actor: string }
  | { kind: 'rollback'; edition: number; why: string | null; actor: string };

export interface OrderResults {
  inspect: Inspection;
  check: undefined;
  publish: { edition: number };
  rollback: RolledBack;
}

export interface ImportJobs {
  /** Orders run one after another. @throws ApiProblem as the order's own code does */
  run<K extends ImportOrder['kind']>(order: Extract<ImportOrder, { kind: K }>): Promise<OrderResults[K]>;
  /**
   * Pending while an edition is being written: whoever wants to write waits here, not in SQLite, where waiting would hold up
   * every other request.
   */
  untilWritable(): Promise<void>;
  /** True in that time: what may be written later is left for then. */
  isWriting(): boolean;
  /** Stops what runs: a check goes on at the next start, a publication did not happen. */
  close(): Promise<void>;
}
