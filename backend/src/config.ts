// Every setting is read and checked here, once, at the start.
import { randomBytes } from 'node:crypto';
import { accessSync, constants, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import * as z from 'zod';
import { topFolder } from './paths.ts';
import { StartProblem } from './start-problem.ts';

const Settings = z.object({
  PORT: z.coerce.number().int().min(0).max(65535).default(4310).describe('Port of site and API; 0 takes any free one.'),
  HOST: z.string().min(1).default('127.0.0.1').describe('Address to listen on.'),
  DATA_DIR: z.string().min(1).default('.data').describe('Folder of the database and the uploads; made where missing.'),
  NODE_ENV: z
    .enum(['production', 'development', 'test', 'trial'])
    .default('trial')
    .describe('Production has no demo accounts and demands SESSION_SECRET.'),
  SESSION_SECRET: z
    .string()
    .min(32)
    .optional()
    .describe('Signs the session cookie; 32 characters or more. Made and kept in the data folder outside production.'),
  SESSION_HOURS: z.coerce
    .number()
    .min(0.001)
    .max(24 * 90)
    .default(24 * 14)
    .describe('A session ends after this many hours without use.'),
  UPLOAD_MAX_MB: z.coerce.number().min(1).max(1000).default(50).describe('Largest table that can be uploaded.'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('warn').describe('How much is logged.'),
  TRUST_PROXY: z.coerce.number().int().min(0).max(5).default(0).describe('How many proxies stand in front; 0 for none.'),
});

export interface Config {
  port: number;
  host: string;
  dataFolder: string;
  uploadsFolder: string;
  mode: 'production' | 'development' | 'test' | 'trial';
  sessionSecret: string;
  sessionMs: number;
  uploadMaxBytes: number;
  logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'silent';
  trustProxy: number;
}

/**
 * Reads the settings from the environment and prepares the data folder.
 * @throws StartProblem in one plain sentence when a setting is wrong or the folder cannot be written.
 */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const known = Object.fromEntries(Object.keys(Settings.shape).map((name) => [name, env[name] === '' ? undefined : env[name]]));
  const parsed = Settings.safeParse(known);
  if (!parsed.success) {
    const issue = parsed.error.issues[0]!;
    throw new StartProblem(`The setting ${String(issue.path[0])} is not usable: ${issue.message}.`);
  }
  const settings = parsed.data;
  const dataFolder = path.resolve(topFolder, settings.DATA_DIR);
  const uploadsFolder = path.join(dataFolder, 'uploads');
  prepareFolder(uploadsFolder, dataFolder);
  const production = settings.NODE_ENV === 'production';
  if (production && !settings.SESSION_SECRET)
    throw new StartProblem('In production SESSION_SECRET has to be set, to 32 characters or more.');
  return {
    port: settings.PORT,
    host: settings.HOST,
    dataFolder,
    uploadsFolder,
    mode: settings.NODE_ENV,
    sessionSecret: settings.SESSION_SECRET ?? keptSecret(dataFolder),
    sessionMs: settings.SESSION_HOURS * 3_600_000,
    uploadMaxBytes: settings.UPLOAD_MAX_MB * 1024 * 1024,
    logLevel: settings.LOG_LEVEL,
    trustProxy: settings.TRUST_PROXY,
  };
}

function prepareFolder(uploadsFolder: string, dataFolder: string): void {
  try {
    makeFolders(uploadsFolder);
    accessSync(dataFolder, constants.W_OK);
    // root passes every access check, also on a read-only disk: only a real write tells.
    writeFileSync(path.join(dataFolder, '.writable'), '');
  } catch (error) {
    throw new StartProblem(
      `The data folder ${dataFolder} cannot be written (${(error as NodeJS.ErrnoException).code ?? 'unknown reason'}); choose another with DATA_DIR.`,
    );
  }
}

/** Step by step: mkdir's own recursion never ends where the system refuses with ENOENT, as /proc does. */
function makeFolders(folder: string): void {
  if (existsSync(folder)) return;
  makeFolders(path.dirname(folder));
  mkdirSync(folder);
}

function keptSecret(dataFolder: string): string {
  const file = path.join(dataFolder, 'session-secret');
  if (existsSync(file)) return readFileSync(file, 'utf8');
  const secret = randomBytes(32).toString('hex');
  writeFileSync(file, secret, { mode: 0o600 });
  return secret;
}
