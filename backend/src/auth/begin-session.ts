import type { Request } from 'express';

/** Signs the request in under a new session id, so that one planted before signing in is worth nothing. */
export async function beginSession(req: Request, userId: string): Promise<void> {
  await new Promise<void>((resolve, reject) => req.login({ id: userId }, (error) => (error ? reject(error) : resolve())));
  req.session.startedAt = new Date().toISOString();
}
