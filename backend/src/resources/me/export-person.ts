// Everything kept about one person, found by the database's own references: a table added later is in the export
// the moment it refers to people, or to something that does.
import type { Db } from '../../db/connect.ts';

interface Reference {
  table: string;
  from: string;
  to: string;
}

/** What would let the reader of an export act as the person. */
const isSecret = (column: string) => /hash|secret|sealed|^data$/.test(column);

type Row = Record<string, unknown>;

/** Rows by table, without secrets; values in JSON columns are opened. */
export function exportPerson(db: Db, userId: string): Record<string, Row[]> {
  const sqlite = db.$client;
  const references = allReferences(db);
  const found = new Map<string, Map<string, Row>>();
  const pending: { table: string; rows: Row[] }[] = [
    { table: 'users', rows: sqlite.prepare('SELECT * FROM users WHERE id = ?').all(userId) as Row[] },
  ];
  for (let next = pending.shift(); next; next = pending.shift()) {
    const known = found.get(next.table) ?? new Map<string, Row>();
    found.set(next.table, known);
    const fresh = next.rows.filter((row) => !known.has(JSON.stringify(row)));
    for (const row of fresh) known.set(JSON.stringify(row), row);
    for (const child of references.filter(({ to }) => to === next.table)) {
      const rows = fresh.flatMap((row) => sqlite.prepare(`SELECT * FROM "${child.table}" WHERE "${child.from}" = ?`).all(row.id) as Row[]);
      if (rows.length > 0) pending.push({ table: child.table, rows });
    }
  }
  const own = sqlite.prepare('SELECT at, action, subject, detail FROM audit_log WHERE actor = ? ORDER BY entry').all(userId) as Row[];
  return Object.fromEntries([
    ...[...found].map(([table, rows]) => [table, [...rows.values()].map(readable)] as const),
    ['audit_log', own.map(readable)] as const,
  ]);
}

/** Single-column references to a table's `id`, those of the whole database. */
export function allReferences(db: Db): Reference[] {
  const sqlite = db.$client;
  const tables = sqlite.prepare("SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%'").all() as {
    name: string;
  }[];
  return tables.flatMap(({ name }) =>
    (sqlite.pragma(`foreign_key_list("${name}")`) as { table: string; from: string }[]).map(({ table, from }) => ({
      table: name,
      from,
      to: table,
    })),
  );
}

const readable = (row: Row): Row =>
  Object.fromEntries(
    Object.entries(row)
      .filter(([column]) => !isSecret(column))
      .map(([column, value]) => [column, opened(value)]),
  );

function opened(value: unknown): unknown {
  if (typeof value !== 'string' || !/^[[{]/.test(value)) return Buffer.isBuffer(value) ? value.toString('base64') : value;
  try {
    return JSON.parse(value);
  } catch {
    return value;
  }
}
