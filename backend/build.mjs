// Bundles the server; packages stay outside, the shared workspace goes in as source.
import path from 'node:path';
import { build } from 'esbuild';

const folder = import.meta.dirname;
await build({
  entryPoints: {
    server: path.join(folder, 'src/server.ts'),
    'import-worker': path.join(folder, 'src/jobs/import-worker.ts'),
    'fit-worker': path.join(folder, 'src/fit-pool/fit-worker.ts'),
  },
  outdir: path.join(folder, 'dist'),
  outExtension: { '.js': '.mjs' },
  bundle: true,
  platform: 'node',
  target: 'node20',
  format: 'esm',
  sourcemap: true,
  packages: 'external',
  alias: { '@tiltwright/shared': path.join(folder, '../shared/src') },
  logLevel: 'warning',
});
