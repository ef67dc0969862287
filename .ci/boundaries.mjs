// Import boundaries; a check that read no modules has checked nothing and fails.
import { spawnSync } from 'node:child_process';
import path from 'node:path';

const top = path.resolve(import.meta.dirname, '..');
const depcruise = path.join(top, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
const { stdout, stderr } = spawnSync(
  process.execPath,
  [depcruise, 'shared/src', 'backend/src', 'frontend/src', '--config', '.dependency-cruiser.cjs', '--output-type', 'json'],
  { cwd: top, encoding: 'utf8', maxBuffer: 1 << 28 },
);
let report;
try {
  report = JSON.parse(stdout);
} catch {
  process.stderr.write(stderr || stdout);
  process.exit(1);
}
const { totalCruised, totalDependenciesCruised, violations } = report.summary;
for (const { rule, from, to } of violations) process.stdout.write(`${rule.severity} ${rule.name}: ${from} → ${to}\n`);
process.stdout.write(`${totalCruised} modules, ${totalDependenciesCruised} imports, ${violations.length} against the rules\n`);
const least = { modules: 100, imports: 200 };
if (totalCruised < least.modules || totalDependenciesCruised < least.imports) {
  process.stderr.write('Too few modules or imports were read for this check to mean anything.\n');
  process.exit(1);
}
process.exit(violations.some(({ rule }) => rule.severity === 'error') ? 1 : 0);
