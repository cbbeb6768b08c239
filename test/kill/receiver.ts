/**
 * A platform that takes what it is sent and sorts nothing out: what is posted twice stands there
 * twice. It can be asked, as platforms can, whether something with a key was posted.
 */
import { createServer, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { onTestFinished } from 'vitest';

export type Posted = { readonly key: string; readonly earlier: unknown };
export type Receiver = { readonly url: string; readonly posted: readonly Posted[] };

export const startReceiver = async (): Promise<Receiver> => {
  const posted: Posted[] = [];
  const server = createServer((request, response) => {
    void bodyOf(request).then(
      (body) => {
        const { look, post } = JSON.parse(body) as { look?: string; post?: Posted };
        if (post !== undefined) posted.push(post);
        const key = look ?? post?.key;
        const at = posted.findIndex((one) => one.key === key);
        response.end(JSON.stringify({ message: at < 0 ? null : at }));
      },
      () => response.destroy(),
    );
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  onTestFinished(() => {
    server.closeAllConnections();
    server.close();
  });
  const { port } = server.address() as AddressInfo;
  return { url: `http://127.0.0.1:${port}/`, posted };
};

/** Only what came whole counts: half a request is none. */
const bodyOf = async (request: IncomingMessage): Promise<string> => {
  let body = '';
  for await (const chunk of request) body += String(chunk);
  if (!request.complete) throw new Error('half a request');
  return body;
};
