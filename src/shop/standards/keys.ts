/** Keys of what happens because of a revision: the same whoever asks, and however often. */
export type RevisionKeys = {
  readonly post: string;
  readonly pin: string;
  readonly unpin: string;
  readonly end: string;
};

export const keysOf = (standard: string, revision: number): RevisionKeys => {
  const of = `standard:${standard}:${String(revision)}`;
  return { post: `${of}:post`, pin: `${of}:pin`, unpin: `${of}:unpin`, end: `${of}:end` };
};
