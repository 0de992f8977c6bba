import { connect, type Socket } from 'node:net';
import { type ReadingRequest } from './reading-requests';

/** Length of an answer that begins with this text; undefined while its head is not whole. */
function lengthOf(received: string): number | undefined {
  const head = received.indexOf('\r\n\r\n');
  if (head < 0) return undefined;
  const [, length = '0'] = /content-length: (\d+)/i.exec(received.slice(0, head)) ?? [];
  return head + 4 + Number(length);
}

/**
 * One kept connection that sends a PUT and waits for its answer: as little work as possible beside the server that is timed.
 * Bodies of the answers are ASCII, so that their length in characters is the one in bytes.
 */
export class PutConnection {
  private received = '';
  private settle: ((status: number) => void) | undefined;
  private fail: ((error: Error) => void) | undefined;

  private constructor(private readonly socket: Socket) {
    socket.setNoDelay(true).setEncoding('latin1');
    socket.on('data', (chunk: string) => {
      this.received += chunk;
      const length = lengthOf(this.received);
      if (length === undefined || this.received.length < length) return;
      const status = Number(this.received.slice(9, 12));
      this.received = '';
      this.settle?.(status);
    });
    socket.once('close', () => this.fail?.(new Error('The server closed the connection.')));
  }

  static open(port: number): Promise<PutConnection> {
    return new Promise((resolve, reject) => {
      const socket = connect(port, '127.0.0.1', () => {
        resolve(new PutConnection(socket));
      });
      socket.once('error', reject);
    });
  }

  /** @throws {Error} for an answer other than 200 */
  async put({ path, cookie, body }: ReadingRequest): Promise<void> {
    const status = await new Promise<number>((resolve, reject) => {
      this.settle = resolve;
      this.fail = reject;
      const headers = `host: 127.0.0.1\r\ncookie: ${cookie}\r\ncontent-type: application/json`;
      this.socket.write(`PUT ${path} HTTP/1.1\r\n${headers}\r\ncontent-length: ${body.length}\r\n\r\n${body}`);
    });
    if (status !== 200) throw new Error(`PUT ${path} was answered with ${status}.`);
  }

  close(): void {
    this.socket.destroy();
  }
}
