import { existsSync } from 'node:fs';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import Database from 'better-sqlite3';
import type { Express } from 'express';
import { pino } from 'pino';
import { createApp } from './app.ts';
import { type Config, readConfig } from './config.ts';
import { connect, type Db, databaseFile } from './db/connect.ts';
import { migrateDatabase } from './db/migrate.ts';
import { demoAccounts, demoPassword, seedDemoWorld } from './db/seed.ts';
import { createDeps } from './deps.ts';
import { fitPool } from './fit-pool/fit-pool.ts';
import { expressServer } from './http/express-server.ts';
import type { ImportJobs } from './jobs/import-jobs.ts';
import { inProcessJobs } from './jobs/in-process-jobs.ts';
import { workerJobs } from './jobs/worker-jobs.ts';
import { startMailWorker } from './mail/mail-worker.ts';
import { mailTransport } from './mail/transport.ts';
import { migrationsFolder, seedsFolder } from './paths.ts';
import { recoverImports } from './resources/imports/recover-imports.ts';
import { startNightly } from './resources/retention/nightly.ts';
import { flushEveryMs } from './resources/usage/usage-counter.ts';
import { StartProblem } from './start-problem.ts';
import { startWebhookWorker } from './webhooks/webhook-worker.ts';

/** Open requests get this long to end when the server is told to stop. */
const patienceMs = 5000;

async function start(): Promise<void> {
  const config = readConfig(process.env);
  const db = openDatabase(config);
  if (config.mode !== 'production') await seedDemoWorld(db, config, seedsFolder);
  const logger = pino({ level: config.logLevel });
  const deps = createDeps(db, config, { jobs: importJobs(db, config), pool: fitPool(config.fitThreads) });
  const app = createApp(deps, logger);
  // First the port, then the work left over: where another server has both port and folder, nothing of its is touched.
  const server = await listen(app, config);
  recoverImports(db, deps.jobs, (error) => logger.error({ err: error }, 'a check taken up again failed'));
  const flushing = setInterval(() => {
    if (!deps.jobs.isWriting()) deps.usage.flush();
  }, flushEveryMs).unref();
  const stopWebhooks = startWebhookWorker(db, config, logger, () => !deps.jobs.isWriting());
  const { port } = server.address() as AddressInfo;
  // Any free port is known only now; links in mails begin with it.
  if (config.port === 0 && process.env.SITE_URL === undefined) config.siteUrl = siteAddress(config, port);
  const stopMail = startMailWorker(deps, mailTransport(config), logger);
  const stopNightly = startNightly(deps, logger);
  stopOnSignal(server, async () => {
    clearInterval(flushing);
    await stopWebhooks();
    await Promise.all([stopMail(), stopNightly()]);
    await deps.jobs.close();
    await deps.pool.close();
    deps.usage.flush();
    db.$client.close();
  });
  greet(config, port);
}

function openDatabase(config: Config): Db {
  try {
    const db = connect(databaseFile(config.dataFolder));
    migrateDatabase(db, migrationsFolder);
    return db;
  } catch (error) {
    if (error instanceof Database.SqliteError)
      throw new StartProblem(`The database in ${config.dataFolder} cannot be opened: ${error.message}.`);
    throw error;
  }
}

function listen(app: Express, config: Config): Promise<Server> {
  return new Promise((resolve, reject) => {
    const server = expressServer(app);
    server.once('error', ({ code }: NodeJS.ErrnoException) => {
      const reason =
        code === 'EADDRINUSE'
          ? `Port ${config.port} is taken by another program`
          : `The server cannot listen on ${config.host}:${config.port} (${code})`;
      reject(new StartProblem(`${reason}; choose another with PORT.`));
    });
    server.listen(config.port, config.host, () => resolve(server));
  });
}

/** The bundle has the worker beside it; run from source, imports are done in this process. */
function importJobs(db: Db, config: Config): ImportJobs {
  const entry = path.join(import.meta.dirname, 'import-worker.mjs');
  return existsSync(entry) ? workerJobs(entry, config) : inProcessJobs({ db, config });
}

function stopOnSignal(server: Server, end: () => Promise<void>): void {
  const stop = () => {
    server.close(() => {
      const leave = () => process.exit(0);
      end().then(leave, leave);
    });
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), patienceMs).unref();
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
}

const siteAddress = ({ host }: Config, port: number) => `http://${host.includes(':') ? `[${host}]` : host}:${port}`;

function greet(config: Config, port: number): void {
  const address = siteAddress(config, port);
  const lines = [`Tiltwright is ready on ${address}`, `API: ${address}/api/docs`];
  if (config.mode !== 'production')
    lines.push(`Demo accounts (password for all: ${demoPassword}):`, ...demoAccounts.map(({ email }) => `  ${email}`));
  process.stdout.write(`${lines.join('\n')}\n`);
}

start().catch((error: unknown) => {
  if (error instanceof StartProblem) process.stderr.write(`${error.message}\n`);
  else process.stderr.write(`Tiltwright could not start: ${error instanceof Error ? error.stack : String(error)}\n`);
  process.exit(1);
});
