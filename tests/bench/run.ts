// Runs every bench of this folder in turn, or those whose name begins with a word given: npm run bench -- engine
import { readdirSync } from 'node:fs';

const wanted = process.argv.slice(2);
const benches = readdirSync(import.meta.dirname)
  .filter((name) => name.endsWith('.bench.ts'))
  .filter((name) => wanted.length === 0 || wanted.some((word) => name.startsWith(word)))
  .sort();
if (benches.length === 0) {
  console.error(`no bench begins with ${wanted.join(' or ')}`);
  process.exitCode = 1;
}
for (const name of benches) {
  console.log(`\n${name}`);
  await import(`./${name}`);
}
