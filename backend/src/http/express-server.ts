import http, { IncomingMessage, type Server, ServerResponse } from 'node:http';
import type { Express } from 'express';

/**
 * An http server whose requests and responses are Express's own from the beginning. Express else changes the prototype of
 * both at every request, which drops what the engine has learnt about them.
 */
export function expressServer(app: Express): Server {
  return http.createServer(
    { IncomingMessage: born(IncomingMessage, app.request), ServerResponse: born(ServerResponse, app.response) },
    app,
  );
}

/** A class whose instances have this prototype at once; the prototype descends from the class's own. */
function born<C>(base: C, prototype: object): C {
  function Born(...args: unknown[]) {
    return Reflect.construct(base as new (...args: unknown[]) => object, args, Born);
  }
  Born.prototype = prototype;
  return Born as C;
}
