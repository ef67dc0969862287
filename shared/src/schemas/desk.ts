// The admin's desk: people, invitations, the audit log, mails, the site's health.
import * as z from 'zod';
import { Email, Password, PersonName, Role } from './account.ts';

const Roles = z
  .array(Role)
  .min(1)
  .max(4)
  .transform((roles) => [...new Set(roles)]);

export const Person = z
  .strictObject({
    id: z.string(),
    email: z.string(),
    name: z.string(),
    roles: z.array(Role),
    createdAt: z.iso.datetime(),
    disabledAt: z.iso.datetime().nullable(),
    secondFactor: z.boolean(),
    sessions: z.int().nonnegative().describe('Devices signed in now.'),
  })
  .meta({ id: 'Person' });
export type Person = z.infer<typeof Person>;

export const PersonChange = z
  .strictObject({
    roles: Roles.optional(),
    disabled: z.boolean().optional().describe('A disabled account is signed out at once and its keys stop.'),
  })
  .meta({ id: 'PersonChange' });
export type PersonChange = z.infer<typeof PersonChange>;

export const PersonSession = z
  .strictObject({ id: z.string(), startedAt: z.iso.datetime().nullable(), expiresAt: z.iso.datetime() })
  .meta({ id: 'PersonSession' });
export type PersonSession = z.infer<typeof PersonSession>;

export const NewInvitation = z.strictObject({ email: Email, roles: Roles }).meta({ id: 'NewInvitation' });
export type NewInvitation = z.infer<typeof NewInvitation>;

export const invitationStates = ['open', 'accepted', 'revoked', 'expired'] as const;
export const Invitation = z
  .strictObject({
    id: z.string(),
    email: z.string(),
    roles: z.array(Role),
    state: z.enum(invitationStates),
    invitedBy: z.string().describe('Opaque id.'),
    createdAt: z.iso.datetime(),
    expiresAt: z.iso.datetime(),
  })
  .meta({ id: 'Invitation' });
export type Invitation = z.infer<typeof Invitation>;

/** What the holder of the link sees before deciding. */
export const InvitationOffer = z
  .strictObject({
    email: z.string(),
    roles: z.array(Role),
    expiresAt: z.iso.datetime(),
    hasAccount: z.boolean().describe('The address has an account: sign in with it to accept.'),
  })
  .meta({ id: 'InvitationOffer' });
export type InvitationOffer = z.infer<typeof InvitationOffer>;

export const InvitationAnswer = z
  .strictObject({ name: PersonName.optional(), password: Password.optional() })
  .describe('Name and password of the new account; nothing where the address has one and is signed in.')
  .meta({ id: 'InvitationAnswer' });
export type InvitationAnswer = z.infer<typeof InvitationAnswer>;

export const AuditEntry = z
  .strictObject({
    entry: z.int(),
    at: z.iso.datetime(),
    actor: z.string().nullable().describe('Opaque id; null for a visitor or the site itself.'),
    actorName: z.string().nullable().describe('Null once the person has left.'),
    action: z.string(),
    subject: z.string().nullable(),
    detail: z.record(z.string(), z.unknown()),
  })
  .meta({ id: 'AuditEntry' });
export type AuditEntry = z.infer<typeof AuditEntry>;

export const mailStates = ['queued', 'sending', 'sent', 'failed'] as const;
export const Mail = z
  .strictObject({
    id: z.string(),
    kind: z.string(),
    to: z.string(),
    subject: z.string(),
    status: z.enum(mailStates),
    attempts: z.int().nonnegative(),
    nextTryAt: z.iso.datetime().nullable(),
    problem: z.string().nullable().describe('What the mail server said last.'),
    createdAt: z.iso.datetime(),
    sentAt: z.iso.datetime().nullable(),
  })
  .meta({ id: 'Mail' });
export type Mail = z.infer<typeof Mail>;
export const MailSheet = Mail.extend({
  text: z.string().nullable().describe('Null once erased, and for a mail whose link opens something, unless it never leaves this machine.'),
}).meta({ id: 'MailSheet' });
export type MailSheet = z.infer<typeof MailSheet>;

const Bytes = z.int().nonnegative();
export const Health = z
  .strictObject({
    status: z.enum(['good', 'care', 'bad']).describe('bad: uploads are refused or mails fail; care: soon.'),
    remarks: z.array(z.string()).describe('What to look after, in sentences.'),
    startedAt: z.iso.datetime(),
    edition: z.int().nonnegative(),
    disk: z.strictObject({ freeBytes: Bytes, totalBytes: Bytes, reserveBytes: Bytes, belowReserve: z.boolean() }),
    bytes: z.array(z.strictObject({ kind: z.string(), bytes: Bytes })).describe('What takes the room, largest first.'),
    memoryBytes: Bytes,
    mails: z.strictObject({ queued: z.int(), failed: z.int(), oldestQueuedAt: z.iso.datetime().nullable(), leaves: z.boolean() }),
    people: z.strictObject({ accounts: z.int(), disabled: z.int(), sessions: z.int() }),
    lastTidied: z.strictObject({ at: z.iso.datetime(), removed: z.record(z.string(), z.int()) }).nullable(),
  })
  .meta({ id: 'Health' });
export type Health = z.infer<typeof Health>;
