import { createServer, IncomingMessage, ServerResponse, type Server } from 'node:http';
import type { Express } from 'express';

/**
 * A server whose requests and responses are born with the app's prototypes. Express gives each request's
 * objects new prototypes otherwise, which costs more than the rest of its work together, since V8 drops what
 * it has learnt about an object whose prototype changes. They have to be classes that extend: an object that is
 * made for any other `new.target` gets a hidden class of its own, which is slower still.
 */
export function createHttpServer(app: Express): Server {
  class AppRequest extends IncomingMessage {}
  class AppResponse extends ServerResponse {}
  Object.setPrototypeOf(AppRequest.prototype, app.request);
  Object.setPrototypeOf(AppResponse.prototype, app.response);
  app.request = AppRequest.prototype as typeof app.request;
  app.response = AppResponse.prototype as typeof app.response;
  return createServer(
    {
      IncomingMessage: AppRequest,
      ServerResponse: AppResponse,
      keepAliveTimeout: 65_000,
      headersTimeout: 15_000,
      requestTimeout: 60_000,
      // A page of its own says more than an empty 400.
      requireHostHeader: true,
    },
    app,
  );
}
