/** What a promise brings, or something else once it has taken too long. */
export const within = <T>(answer: Promise<T>, ms: number, otherwise: T): Promise<T> =>
  new Promise((done, failed) => {
    const timer = setTimeout(done, ms, otherwise);
    answer.then(done, failed).finally(() => {
      clearTimeout(timer);
    });
  });
