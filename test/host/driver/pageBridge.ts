import { randomBytes } from 'node:crypto';
import { createServer, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { PageAction } from './pageActions';

export interface PageBridge {
  /** Where the suite finds it, with the secret in the path. */
  readonly url: string;
  close(): void;
}

async function bodyOf(request: IncomingMessage): Promise<string> {
  let body = '';
  for await (const chunk of request) body += String(chunk);
  return body;
}

/** Takes actions over loopback and answers each with `{ result }` or `{ error }`. */
export async function pageBridge(perform: (action: PageAction) => Promise<unknown>): Promise<PageBridge> {
  const secret = `/${randomBytes(16).toString('hex')}`;
  const server = createServer((request, response) => {
    const answer = (status: number, value: unknown) => {
      response.writeHead(status, { 'content-type': 'application/json', 'access-control-allow-origin': '*' });
      response.end(JSON.stringify(value));
    };
    if (request.url !== secret || request.method !== 'POST') {
      answer(404, { error: 'not here' });
      return;
    }
    bodyOf(request)
      .then(async (body) => answer(200, { result: (await perform(JSON.parse(body) as PageAction)) ?? null }))
      .catch((error: unknown) => answer(200, { error: error instanceof Error ? error.message : String(error) }));
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${port}${secret}`,
    close: () => {
      server.closeAllConnections();
      server.close();
    },
  };
}
