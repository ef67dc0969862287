import type { Actor } from './auth/actor.ts';

declare global {
  namespace Express {
    interface Request {
      actor: Actor;
    }
    interface User {
      id: string;
    }
  }
}

declare module 'express-session' {
  interface SessionData {
    passport?: { user?: string };
    startedAt?: string;
  }
}
