const units = ['bytes', 'KB', 'MB', 'GB', 'TB'] as const;

/** A number of bytes as people say it: "12 MB", in steps of 1024. */
export function bytesWords(bytes: number): string {
  let value = bytes;
  let step = 0;
  while (value >= 1024 && step < units.length - 1) {
    value /= 1024;
    step += 1;
  }
  return `${value < 10 && step > 0 ? value.toFixed(1) : Math.round(value)} ${units[step]}`;
}

const kinds: Record<string, string> = {
  uploads: 'uploaded files',
  importRows: 'rows of imports',
  mailBodies: 'bodies of mails',
  signUps: 'unfinished sign-ups',
  passwordResets: 'links for passwords',
  invitations: 'old invitations',
  sessions: 'ended sessions',
  auditEntries: 'audit entries',
  deliveries: 'webhook deliveries',
};

/** What a night's tidying removed, in one line. */
export function removedWords(removed: Record<string, number>): string {
  const parts = Object.entries(removed)
    .filter(([, count]) => count > 0)
    .map(([kind, count]) => `${count} ${kinds[kind] ?? kind}`);
  return parts.length === 0 ? 'nothing was old enough to go' : `removed ${parts.join(', ')}`;
}
