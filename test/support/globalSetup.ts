import type { TestProject } from 'vitest/node';
import { startPostgres } from './postgresServer.ts';

/** One server for the whole run; every test file makes itself a database on it. */
export const setup = async (project: TestProject): Promise<() => Promise<void>> => {
  const server = await startPostgres();
  project.provide('postgres', server.url);
  return server.stop;
};

declare module 'vitest' {
  interface ProvidedContext {
    postgres: string;
  }
}
