import type { z } from 'zod';
import type { ConsoleServices } from '../../services/console/ConsoleServices';
import type { SignedIn } from '../../services/sessions/liveSession';
import type { Visit } from './Visit';

export type ConsoleMethod = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** How often one place may ask: `usual`, or less where passwords are tried or mails are sent. */
export type Limit = 'usual' | 'secrets' | 'mails';

type Shape = z.ZodType<Record<string, unknown>>;

export interface Given<Params, Query, Body> {
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
}

interface Described {
  readonly id: string;
  readonly method: ConsoleMethod;
  /** With `:name` for what `params` holds. */
  readonly path: string;
  readonly tag: 'account' | 'session' | 'keys' | 'usage' | 'plan' | 'saved';
  readonly summary: string;
  readonly limit: Limit;
  readonly status: 200 | 201 | 202 | 204;
  /** Statuses of problems beyond those that any request can get. */
  readonly problems: readonly number[];
  /** What may leave; null for an answer without content. */
  readonly answer: Shape | null;
  readonly headers?: readonly string[];
}

interface Reads<Params extends Shape, Query extends Shape, Body extends Shape> {
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
}

type GivenBy<P extends Shape, Q extends Shape, B extends Shape> = Given<
  z.output<P>,
  z.output<Q>,
  z.output<B>
>;

type Open<P extends Shape, Q extends Shape, B extends Shape> = Described &
  Reads<P, Q, B> & {
    readonly access: 'anyone';
    handle(given: GivenBy<P, Q, B>, visit: Visit, services: ConsoleServices): Promise<unknown>;
  };

type Closed<P extends Shape, Q extends Shape, B extends Shape> = Described &
  Reads<P, Q, B> & {
    readonly access: 'session';
    handle(
      given: GivenBy<P, Q, B>,
      visit: Visit & { readonly signedIn: SignedIn },
      services: ConsoleServices,
    ): Promise<unknown>;
  };

/** One address of the console's API: who may, what comes in, what is done and what goes out stand together. */
export type Route = Open<Shape, Shape, Shape> | Closed<Shape, Shape, Shape>;

/** A route for anyone. */
export function openRoute<P extends Shape = Shape, Q extends Shape = Shape, B extends Shape = Shape>(
  route: Omit<Open<P, Q, B>, 'access'>,
): Route {
  return { ...route, access: 'anyone' } as unknown as Route;
}

/** A route for whoever is signed in. */
export function closedRoute<P extends Shape = Shape, Q extends Shape = Shape, B extends Shape = Shape>(
  route: Omit<Closed<P, Q, B>, 'access'>,
): Route {
  return { ...route, access: 'session' } as unknown as Route;
}

export type { ConsoleServices };
