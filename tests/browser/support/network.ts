import { createServer, request, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo, Socket } from 'node:net';

const marked = '<meta name="release" content="second" />';

/**
 * The way between a browser and the product, which can be cut, and which can bring the next release: the same files,
 * another page and so another service worker, and none of the code files that the first release still asks for.
 */
export class Network {
  private cutOff = false;
  private released = false;
  private readonly sockets = new Set<Socket>();
  private readonly server = createServer((incoming, outgoing) => this.pass(incoming, outgoing));

  constructor(private readonly product: string) {
    this.server.on('connection', (socket) => {
      this.sockets.add(socket);
      socket.once('close', () => this.sockets.delete(socket));
    });
  }

  /** The address at which the browser finds the product. */
  async open(): Promise<string> {
    await new Promise<void>((resolve) => this.server.listen(0, '127.0.0.1', resolve));
    return `http://localhost:${(this.server.address() as AddressInfo).port}`;
  }

  async close(): Promise<void> {
    this.cut();
    await new Promise((resolve) => this.server.close(resolve));
  }

  cut(): void {
    this.cutOff = true;
    for (const socket of this.sockets) socket.destroy();
  }

  mend(): void {
    this.cutOff = false;
  }

  /** Brings the next release. */
  release(): void {
    this.released = true;
  }

  private pass(incoming: IncomingMessage, outgoing: ServerResponse): void {
    const { url = '/', method, headers } = incoming;
    if (this.cutOff) return void incoming.socket.destroy();
    if (this.released && url.startsWith('/_expo/')) return void outgoing.writeHead(404).end();
    const changed = this.released && (headers.accept?.includes('text/html') || /^\/(index\.html|sw\.js)/.test(url));
    const asked = changed ? { ...headers, 'accept-encoding': 'identity' } : headers;
    const onward = request(`${this.product}${url}`, { method, headers: asked }, (answer) => {
      if (changed) return changeText(answer, outgoing);
      outgoing.writeHead(answer.statusCode ?? 502, answer.headers);
      answer.pipe(outgoing);
    });
    onward.once('error', () => outgoing.destroy());
    incoming.pipe(onward);
  }
}

function changeText(answer: IncomingMessage, outgoing: ServerResponse): void {
  let text = '';
  answer.setEncoding('utf8');
  answer.on('data', (chunk: string) => (text += chunk));
  answer.on('end', () => {
    const { 'content-length': _, etag: __, ...headers } = answer.headers;
    outgoing.writeHead(answer.statusCode ?? 502, headers);
    outgoing.end(
      text.replace('</head>', `${marked}</head>`).replace(/(url:"index\.html",revision:")\w+/, '$1second-release'),
    );
  });
}
