/** What a call brings along: a body of JSON, by itself or beside files (RFC 7578). */
import type http from 'node:http';
import type { File } from './rooms.ts';
import type { Body } from './rules.ts';

export type Sent = {
  readonly body: Body;
  readonly files: readonly File[];
  readonly query: URLSearchParams;
};

type Part = { readonly name: string; readonly file: string | null; readonly content: string };

const readBody = async (request: http.IncomingMessage): Promise<Buffer> => {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
};

/** The parts between the boundaries. A byte is a character: no byte is lost on the way. */
const partsIn = (bytes: Buffer, boundary: string): readonly Part[] =>
  bytes
    .toString('latin1')
    .split(`--${boundary}`)
    .slice(1, -1)
    .map((part) => {
      const end = part.indexOf('\r\n\r\n');
      const head = part.slice(0, end);
      return {
        name: / name="([^"]*)"/u.exec(head)?.[1] ?? '',
        file: / filename="([^"]*)"/u.exec(head)?.[1] ?? null,
        content: part.slice(end + 4, -2),
      };
    });

type Said = { readonly id: string; readonly description?: string };

/** The body of a call, whether files come with it or not. */
export const sentIn = async (
  request: http.IncomingMessage,
  query: URLSearchParams,
): Promise<Sent> => {
  const bytes = await readBody(request);
  const boundary = /boundary=(?:"([^"]+)"|([^;]+))/u.exec(request.headers['content-type'] ?? '');
  if (boundary === null) {
    const text = bytes.toString();
    return { body: text === '' ? {} : (JSON.parse(text) as Body), files: [], query };
  }
  const parts = partsIn(bytes, boundary[1] ?? boundary[2] ?? '');
  const json = parts.find(({ name }) => name === 'payload_json')?.content ?? '{}';
  const body = JSON.parse(Buffer.from(json, 'latin1').toString()) as Body;
  const said = (body['attachments'] ?? []) as readonly Said[];
  const files = parts.flatMap(({ name, file, content }): readonly File[] => {
    const index = /^files\[(\d+)\]$/u.exec(name)?.[1];
    if (index === undefined || file === null) return [];
    const alt = said.find(({ id }) => id === index)?.description ?? '';
    return [{ name: file, bytes: content.length, alt }];
  });
  return { body, files, query };
};
