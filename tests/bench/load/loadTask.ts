/** What the asking side is told to do. */
export interface LoadTask {
  /** Where to ask; each port gets all the connections. */
  readonly ports: readonly number[];
  /** The request as it goes over the wire. */
  readonly request: string;
  /** What every answer's status must be. */
  readonly status: number;
  readonly connections: number;
  readonly seconds: number;
  /** Calls a second; left out, each connection asks again as soon as it is answered. */
  readonly rate?: number;
}

export interface LoadResult {
  readonly perSecond: number;
  /** From due to answered; only where a rate was set. */
  readonly latenciesMs: readonly number[];
}
