import { REFUSALS } from './limits.ts';

export type Refused = keyof typeof REFUSALS;

/** A response address that did not take a post. */
export class ResponseRefused extends Error {
  readonly status: number;
  constructor(status: number) {
    super(`HTTP ${String(status)}`);
    this.status = status;
  }
}

const field = (value: unknown, name: string): unknown =>
  typeof value === 'object' && value !== null && name in value
    ? (value as Record<string, unknown>)[name]
    : undefined;

/** Slack's own word for an error, or null where it is none of Slack's. */
export const codeOf = (error: unknown): string | null => {
  const code = field(field(error, 'data'), 'error');
  return typeof code === 'string' ? code : null;
};

export const isRefused = (error: unknown, ...kinds: readonly Refused[]): boolean => {
  const code = codeOf(error);
  return code !== null && kinds.some((kind) => REFUSALS[kind].some((each) => each === code));
};

const statusOf = (error: unknown): number | null => {
  if (error instanceof ResponseRefused) return error.status;
  const status = field(error, 'statusCode');
  return typeof status === 'number' ? status : null;
};

const PASSING = new Set([
  'internal_error',
  'fatal_error',
  'service_unavailable',
  'request_timeout',
]);

/** The client waits as long as Slack asks, with its queue held, and then says so. */
const isPaused = (error: unknown): boolean =>
  error instanceof Error && error.message.startsWith('A rate limit was exceeded');

/** It may go well the next time: the platform's own fault, or the line's. */
export const isPassing = (error: unknown): boolean => {
  const status = statusOf(error);
  if (status !== null) return status >= 500 || status === 429;
  const code = codeOf(error);
  if (code !== null) return PASSING.has(code) || code === 'ratelimited';
  if (isPaused(error)) return true;
  if (!(error instanceof Error)) return false;
  if (field(error, 'code') === 'slack_webapi_request_error') return true;
  return error.name === 'TimeoutError' || error instanceof TypeError;
};

/** It is not known whether Slack did it all the same. */
export const mayBeDone = (error: unknown): boolean => isPassing(error) && !isPaused(error);

/** What the platform said, without address, body or token of the call. */
export const faultText = (error: unknown): string => {
  const code = codeOf(error);
  if (code !== null) return code;
  const status = statusOf(error);
  if (status !== null) return `HTTP ${String(status)}`;
  return error instanceof Error ? error.name : 'unknown fault';
};
