import { connect, type Socket } from 'node:net';

const HEAD_END = '\r\n\r\n';
const LENGTH = /\r\ncontent-length: *(\d+)/i;
const NOTHING = Buffer.alloc(0);

/**
 * One keep-alive connection that asks and waits for the answer. No more of HTTP than an answer's status and end is
 * read, so that the asking side costs little beside the server's.
 */
export class HttpConnection {
  readonly #socket: Socket;
  #held: Buffer = NOTHING;

  private constructor(
    socket: Socket,
    private readonly onAnswer: (connection: HttpConnection, status: number) => void,
  ) {
    this.#socket = socket;
    socket.on('data', (chunk) => this.#read(chunk));
  }

  static open(
    port: number,
    onAnswer: (connection: HttpConnection, status: number) => void,
    onLost: (error: Error) => void,
  ): Promise<HttpConnection> {
    return new Promise((resolve, reject) => {
      const socket = connect({ port, host: '127.0.0.1', noDelay: true });
      socket.once('error', reject);
      socket.once('connect', () => {
        socket.off('error', reject);
        socket.on('error', onLost);
        socket.on('end', () => onLost(new Error('the server closed a connection')));
        resolve(new HttpConnection(socket, onAnswer));
      });
    });
  }

  ask(request: Buffer): void {
    this.#socket.write(request);
  }

  close(): void {
    this.#socket.removeAllListeners('end');
    this.#socket.destroy();
  }

  #read(chunk: Buffer): void {
    const given = this.#held.length === 0 ? chunk : Buffer.concat([this.#held, chunk]);
    const end = given.indexOf(HEAD_END);
    const head = end < 0 ? '' : given.toString('latin1', 0, end);
    const whole = end + HEAD_END.length + Number(LENGTH.exec(head)?.[1] ?? 0);
    if (end < 0 || given.length < whole) {
      this.#held = given;
      return;
    }
    this.#held = NOTHING;
    this.onAnswer(this, Number(head.slice(9, 12)));
  }
}
