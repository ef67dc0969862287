// Every setting is read and checked here, once, at the start.
import { randomBytes } from 'node:crypto';
import { accessSync, constants, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import path from 'node:path';
import * as z from 'zod';
import { topFolder } from './paths.ts';
import { StartProblem } from './start-problem.ts';

const units = z.coerce.number().int().min(1).max(1e9);
const limit = (usual: number) => units.default(usual);

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
  SITE_URL: z
    .url({ protocol: /^https?$/ })
    .optional()
    .describe('Address people reach the site at; links in mails begin with it. In production needed with SMTP_URL.'),
  SMTP_URL: z
    .url({ protocol: /^smtps?$/ })
    .optional()
    .describe('Mail server, smtp(s)://user:password@host:port. Without it mails stay in the data folder’s outbox, for the admin to read.'),
  MAIL_FROM: z.string().min(3).max(200).default('Tiltwright <no-reply@tiltwright.example>').describe('Sender of every mail.'),
  STAFF_SECOND_FACTOR: z
    .enum(['true', 'false'])
    .default('false')
    .describe('true: stewards and admins do nothing of their work without a second factor.'),
  FREE_SPACE_RESERVE_MB: z.coerce
    .number()
    .min(0)
    .default(256)
    .describe('Below this much free space uploads and imports are refused; reading and signing in go on.'),
  KEEP_UPLOADS_DAYS: z.coerce.number().min(1).default(180).describe('Uploaded tables and their rows are kept this long after publishing.'),
  KEEP_MAIL_DAYS: z.coerce.number().min(1).default(30).describe('Bodies of mails are kept this long.'),
  KEEP_AUDIT_YEARS: z.coerce.number().min(1).default(7).describe('Entries of the audit log are kept this long.'),
  TIDY_HOUR: z.coerce
    .number()
    .int()
    .min(0)
    .max(23)
    .default(3)
    .describe('Hour of the night, by this machine’s clock, at which old things are removed.'),
  LIMIT_ANONYMOUS: units
    .optional()
    .describe('Units a minute for an address nobody is signed in from: 60, in a trial 6000. The admin can change all limits later.'),
  LIMIT_PAGE: limit(1200).describe('Units a minute for the pages of this site in one browser.'),
  LIMIT_ACCOUNT: limit(600).describe('Units a minute for an account.'),
  LIMIT_KEY: limit(6000).describe('Units a minute for an API key.'),
  LIMIT_KEY_DAY: limit(500_000).describe('Units a day for an API key.'),
  WEBHOOK_PRIVATE_TARGETS: z
    .enum(['true', 'false'])
    .default('false')
    .describe('true: webhooks may point to this machine and its network, for trials; refused in production.'),
  KEEP_DELIVERIES_DAYS: z.coerce.number().min(1).default(30).describe('Deliveries of webhooks are kept this long.'),
  FIT_THREADS: z.coerce
    .number()
    .int()
    .min(0)
    .max(64)
    .default(Math.min(8, availableParallelism()))
    .describe('Threads that work out fits; 0 does them in the one that answers requests.'),
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
  /** Without a slash at its end. */
  siteUrl: string;
  outboxFolder: string;
  smtpUrl: string | null;
  mailFrom: string;
  staffSecondFactor: boolean;
  freeSpaceReserveBytes: number;
  keepUploadsDays: number;
  keepMailDays: number;
  keepAuditYears: number;
  tidyHour: number;
  fitThreads: number;
  webhookPrivateTargets: boolean;
  keepDeliveriesDays: number;
  /** Units a minute, and for keys also a day; what a kind of caller has until an admin says otherwise. */
  limits: { anonymous: number; page: number; account: number; key: number; keyDay: number };
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
  // The demo accounts' password stands in the readme: a trial is for this machine alone.
  if (settings.NODE_ENV === 'trial' && !/^(127\.|::1$|localhost$)/.test(settings.HOST))
    throw new StartProblem('A trial listens on this machine only; to be reached from others set NODE_ENV=production.');
  const dataFolder = path.resolve(topFolder, settings.DATA_DIR);
  const uploadsFolder = path.join(dataFolder, 'uploads');
  const outboxFolder = path.join(dataFolder, 'outbox');
  prepareFolders(dataFolder, [uploadsFolder, outboxFolder]);
  const production = settings.NODE_ENV === 'production';
  if (production && !settings.SESSION_SECRET)
    throw new StartProblem('In production SESSION_SECRET has to be set, to 32 characters or more.');
  if (production && settings.WEBHOOK_PRIVATE_TARGETS === 'true')
    throw new StartProblem('In production WEBHOOK_PRIVATE_TARGETS cannot be true: webhooks could reach into your own network.');
  if (production && settings.SMTP_URL && !settings.SITE_URL)
    throw new StartProblem('In production SITE_URL has to be set where SMTP_URL is: links in mails begin with it.');
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
    siteUrl: (settings.SITE_URL ?? `http://${settings.HOST}:${settings.PORT}`).replace(/\/+$/, ''),
    outboxFolder,
    smtpUrl: settings.SMTP_URL ?? null,
    mailFrom: settings.MAIL_FROM,
    staffSecondFactor: settings.STAFF_SECOND_FACTOR === 'true',
    freeSpaceReserveBytes: settings.FREE_SPACE_RESERVE_MB * 1024 * 1024,
    keepUploadsDays: settings.KEEP_UPLOADS_DAYS,
    keepMailDays: settings.KEEP_MAIL_DAYS,
    keepAuditYears: settings.KEEP_AUDIT_YEARS,
    tidyHour: settings.TIDY_HOUR,
    fitThreads: settings.FIT_THREADS,
    webhookPrivateTargets: settings.WEBHOOK_PRIVATE_TARGETS === 'true',
    keepDeliveriesDays: settings.KEEP_DELIVERIES_DAYS,
    limits: {
      // A trial serves this machine alone: whoever tries it out is not to run dry after three checks.
      anonymous: settings.LIMIT_ANONYMOUS ?? (settings.NODE_ENV === 'trial' ? 6000 : 60),
      page: settings.LIMIT_PAGE,
      account: settings.LIMIT_ACCOUNT,
      key: settings.LIMIT_KEY,
      keyDay: settings.LIMIT_KEY_DAY,
    },
  };
}

function prepareFolders(dataFolder: string, inside: readonly string[]): void {
  try {
    for (const folder of inside) makeFolders(folder);
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
