// Signing up, lost passwords, second factors and a person's own account.
import * as z from 'zod';
import { Email, Password, PersonName, Units } from './account.ts';

/** The same for an address that has an account and for one that has none. */
export const MailPromise = z
  .strictObject({
    detail: z.string(),
    outbox: z.string().nullable().describe('Page where a trial’s mails can be read; null where mails are really sent.'),
  })
  .meta({ id: 'MailPromise' });
export type MailPromise = z.infer<typeof MailPromise>;

const Token = z.string().min(1).max(200);

export const Verification = z
  .strictObject({
    token: Token.describe('From the mail’s link.'),
    password: z.string().min(1).max(200).describe('The one chosen when signing up.'),
  })
  .meta({ id: 'Verification' });
export type Verification = z.infer<typeof Verification>;

export const ResetRequest = z.strictObject({ email: Email }).meta({ id: 'ResetRequest' });
export type ResetRequest = z.infer<typeof ResetRequest>;
export const NewPassword = z.strictObject({ password: Password }).meta({ id: 'NewPassword' });
export type NewPassword = z.infer<typeof NewPassword>;

export const ProfileChange = z.strictObject({ name: PersonName.optional(), units: Units.optional() }).meta({ id: 'ProfileChange' });
export type ProfileChange = z.infer<typeof ProfileChange>;

const Given = z.string().min(1).max(200).describe('The account’s password as it is.');
export const PasswordChange = z.strictObject({ current: Given, password: Password }).meta({ id: 'PasswordChange' });
export type PasswordChange = z.infer<typeof PasswordChange>;
export const PasswordProof = z.strictObject({ password: Given }).meta({ id: 'PasswordProof' });
export type PasswordProof = z.infer<typeof PasswordProof>;

export const SecondFactor = z
  .strictObject({
    enabled: z.boolean(),
    since: z.iso.datetime().nullable(),
    recoveryCodesLeft: z.int().nonnegative(),
    demanded: z.boolean().describe('This site asks it of whoever does staff work.'),
  })
  .meta({ id: 'SecondFactor' });
export type SecondFactor = z.infer<typeof SecondFactor>;

export const BegunSecondFactor = z
  .strictObject({
    secret: z.string().describe('Base32, to type into an authenticator by hand; shown once.'),
    uri: z.string().describe('The same as an otpauth address, which opens an authenticator on the same device.'),
  })
  .meta({ id: 'BegunSecondFactor' });
export type BegunSecondFactor = z.infer<typeof BegunSecondFactor>;

export const CodeProof = z
  .strictObject({ code: z.string().trim().min(6).max(40).describe('Six digits of the authenticator.') })
  .meta({ id: 'CodeProof' });
export type CodeProof = z.infer<typeof CodeProof>;

export const RecoveryCodes = z
  .strictObject({ codes: z.array(z.string()).describe('Each signs in once where the authenticator is lost. Shown once.') })
  .meta({ id: 'RecoveryCodes' });
export type RecoveryCodes = z.infer<typeof RecoveryCodes>;
