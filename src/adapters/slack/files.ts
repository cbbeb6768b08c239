import type { Answer, Call, Desk } from '../../desk/index.ts';
import { LIMITS } from './limits.ts';
import type { Sender } from './send.ts';

/** Null where it is larger than is held in memory; the rest of it is not made then. */
const contentOf = async (parts: AsyncIterable<string>): Promise<Buffer | null> => {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const part of parts) {
    const chunk = Buffer.from(part, 'utf8');
    length += chunk.length;
    if (length > LIMITS.fileBytes) return null;
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
};

export const filesOf = (answer: Answer | null): readonly string[] =>
  answer?.kind === 'card' ? (answer.files ?? []) : [];

/**
 * The files that an answer names, to the one person who may have them: Slack has no private file in
 * a channel. Names those that could not be sent.
 */
export const sendFiles = async (
  { desk, sender }: { readonly desk: Desk; readonly sender: Sender },
  call: Call,
  names: readonly string[],
  onFault: (error: unknown) => void,
): Promise<readonly string[]> => {
  const left: string[] = [];
  for (const name of names)
    try {
      const parts = await desk.download(call, name);
      const bytes = parts === null ? null : await contentOf(parts);
      if (bytes === null) left.push(name);
      else await sender.file(call.person.id, name, bytes);
    } catch (error) {
      onFault(error);
      left.push(name);
    }
  return left;
};
