/**
 * A line to a server that can be cut at a chosen message: what a request meets when a server or
 * the way to it goes down in the middle.
 */
import net from 'node:net';
import { onTestFinished } from 'vitest';

export type CutProxy = {
  /** The same database, through this line. */
  readonly url: string;
  /** Cuts the next time a message holds these words: before the server has it, or after. */
  readonly cutAt: (words: string, when: 'before' | 'after') => void;
  readonly cuts: () => number;
};

export const cutProxy = async (target: string): Promise<CutProxy> => {
  const to = new URL(target);
  let cut: { words: string; when: 'before' | 'after' } | null = null;
  let cuts = 0;
  const server = net.createServer((client) => {
    const upstream = net.connect(Number(to.port), to.hostname);
    const end = () => {
      client.destroy();
      upstream.destroy();
    };
    client.on('error', end).on('close', end);
    upstream.on('error', end).on('close', end);
    client.on('data', (chunk) => {
      const isHit = cut !== null && chunk.includes(cut.words);
      const when = cut?.when;
      if (isHit) {
        cut = null;
        cuts += 1;
      }
      if (isHit && when === 'before') {
        end();
        return;
      }
      upstream.write(chunk);
      // The server acts on it; its answer never arrives.
      if (isHit) {
        upstream.removeAllListeners('data');
        upstream.once('data', end);
      }
    });
    upstream.on('data', (chunk) => client.write(chunk));
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  onTestFinished(() => {
    server.close();
  });
  const url = new URL(target);
  url.hostname = '127.0.0.1';
  url.port = String((server.address() as net.AddressInfo).port);
  return {
    url: url.toString(),
    cutAt: (words, when) => {
      cut = { words, when };
    },
    cuts: () => cuts,
  };
};
