// drizzle-kit has no word for STRICT: add it to every CREATE TABLE of the generated migrations.
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const folder = path.join(import.meta.dirname, 'migrations');
for (const file of readdirSync(folder).filter((name) => name.endsWith('.sql'))) {
  const before = readFileSync(path.join(folder, file), 'utf8');
  const after = before.replace(/(^CREATE TABLE [\s\S]*?\n\));$/gm, '$1 STRICT;');
  if (after !== before) writeFileSync(path.join(folder, file), after);
}
