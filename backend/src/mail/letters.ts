// What the site writes, and when. Names come from people: they are cut short and never stand where a link is expected.
import type { MailBody } from './compose.ts';

export type MailKind =
  | 'verify-address'
  | 'account-exists'
  | 'reset-password'
  | 'password-changed'
  | 'second-factor-changed'
  | 'invitation'
  | 'storage-low'
  | 'webhook-disabled'
  | 'notice';

export interface Letter extends MailBody {
  kind: MailKind;
  /** The link opens something for whoever holds it. */
  secret: boolean;
}

const ifNotYou = 'If it was not you, do nothing; nothing happens then.';

export const verifyAddress = (url: string, hours: number): Letter => ({
  kind: 'verify-address',
  secret: true,
  subject: 'Finish making your Tiltwright account',
  paragraphs: ['Someone, we hope you, asked for an account with this e-mail address.'],
  link: { label: 'Finish making the account', url },
  closing: [`The page asks once more for the password you chose. The link works once, within ${hours} hours.`, ifNotYou],
});

export const accountExists = (signInUrl: string): Letter => ({
  kind: 'account-exists',
  secret: false,
  subject: 'You have a Tiltwright account already',
  paragraphs: [
    'Someone, perhaps you, asked for an account with this e-mail address. There is one already, and it stays as it is.',
    'Sign in with it. Where the password is lost, the page there offers a new one.',
  ],
  link: { label: 'Sign in', url: signInUrl },
  closing: [ifNotYou],
});

export const resetPassword = (url: string, hours: number): Letter => ({
  kind: 'reset-password',
  secret: true,
  subject: 'Choose a new Tiltwright password',
  paragraphs: ['Someone, we hope you, asked for a new password for this account.'],
  link: { label: 'Choose a new password', url },
  closing: [
    `The link works once, within ${hours === 1 ? 'an hour' : `${hours} hours`}. Choosing a new password signs the account out everywhere.`,
    ifNotYou,
  ],
});

export const passwordChanged = (resetUrl: string): Letter => ({
  kind: 'password-changed',
  secret: false,
  subject: 'Your Tiltwright password was changed',
  paragraphs: [
    'The password of your account was changed just now, and every other device was signed out.',
    'If that was you, all is well.',
  ],
  link: { label: 'If it was not: choose a new password', url: resetUrl },
});

export const secondFactorChanged = (now: 'on' | 'off', accountUrl: string): Letter => ({
  kind: 'second-factor-changed',
  secret: false,
  subject: now === 'on' ? 'Signing in to Tiltwright now needs a code' : 'Signing in to Tiltwright needs no code any more',
  paragraphs: [
    now === 'on'
      ? 'A second factor was set up for your account: signing in asks for a code from your device as well.'
      : 'The second factor of your account was removed: the password alone signs in.',
    'If that was not you, choose a new password at once.',
  ],
  link: { label: 'Your account', url: accountUrl },
});

export const invitation = (url: string, roleWords: string, days: number): Letter => ({
  kind: 'invitation',
  secret: true,
  subject: 'An invitation to Tiltwright',
  paragraphs: [`Whoever runs this Tiltwright site invites you to an account as ${roleWords}.`],
  link: { label: 'See the invitation', url },
  closing: [`The link works once, within ${days} days.`, 'If you do not want an account, do nothing.'],
});

export const storageLow = (freeMb: number, reserveMb: number, healthUrl: string): Letter => ({
  kind: 'storage-low',
  secret: false,
  subject: 'Tiltwright: little room left on the disk',
  paragraphs: [
    `${freeMb} MB are free where Tiltwright keeps its data; the reserve is ${reserveMb} MB.`,
    'Uploads and imports are refused until there is room again. Reading, checking fits and signing in go on.',
  ],
  link: { label: 'What takes the room', url: healthUrl },
});

export const webhookDisabled = (name: string, why: string, url: string): Letter => ({
  kind: 'webhook-disabled',
  secret: false,
  subject: 'Tiltwright: a webhook was disabled',
  paragraphs: [`Your webhook “${name}” gets no more messages. ${why}`, 'What it missed stays in its delivery log for 30 days.'],
  link: { label: 'Look at it and take it up again', url },
});
