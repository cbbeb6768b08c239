/** Waits for something that happens elsewhere, and says what did not. */
export const until = async (holds: () => boolean, what: string, ms = 10_000): Promise<void> => {
  const end = Date.now() + ms;
  while (!holds()) {
    if (Date.now() > end) throw new Error(`not in time: ${what}`);
    await new Promise((done) => setTimeout(done, 5));
  }
};
