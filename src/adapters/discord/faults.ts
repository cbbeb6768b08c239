import { setTimeout as pause } from 'node:timers/promises';
import { DiscordAPIError, HTTPError, RateLimitError } from 'discord.js';
import { REFUSALS } from './limits.ts';

export type Refused = keyof typeof REFUSALS;

/** Discord's own code of an error, or null where it is none of Discord's. */
const codeOf = (error: unknown): number | null =>
  error instanceof DiscordAPIError ? Number(error.code) : null;

export const isRefused = (error: unknown, ...kinds: readonly Refused[]): boolean => {
  const code = codeOf(error);
  return code !== null && kinds.some((kind) => REFUSALS[kind].some((each) => each === code));
};

/** What was acknowledged can no longer be changed or followed. */
export const isOver = (error: unknown): boolean =>
  isRefused(error, 'unknownInteraction', 'unknownWebhook', 'unknownMessage', 'expiredToken');

/** Errors of a connection, as Node and its HTTP client name them. */
const CONNECTION = new Set([
  'ECONNRESET',
  'ECONNREFUSED',
  'EPIPE',
  'ETIMEDOUT',
  'ENOTFOUND',
  'EAI_AGAIN',
  'UND_ERR_SOCKET',
  'UND_ERR_CONNECT_TIMEOUT',
  'UND_ERR_HEADERS_TIMEOUT',
  'UND_ERR_BODY_TIMEOUT',
]);

/** It may go well the next time: the platform's own fault, or the line's. */
export const isPassing = (error: unknown): boolean => {
  if (error instanceof DiscordAPIError || error instanceof HTTPError) return error.status >= 500;
  if (error instanceof RateLimitError) return true;
  if (!(error instanceof Error)) return false;
  if (error.name === 'AbortError' || error.name === 'TimeoutError') return true;
  const { code } = error as NodeJS.ErrnoException;
  if (code !== undefined && CONNECTION.has(code)) return true;
  return error.cause !== undefined && isPassing(error.cause);
};

/** What was asked for can never be done: no such place, no permission, not in this form. */
const NEVER: readonly number[] = [400, 403, 404];
export const isFinal = (error: unknown): boolean =>
  error instanceof DiscordAPIError && NEVER.includes(error.status);

/** What the platform said, without address, body or token of the call. */
export const faultText = (error: unknown): string => {
  if (error instanceof DiscordAPIError) return `${String(error.code)} ${error.message}`;
  if (error instanceof HTTPError) return `HTTP ${String(error.status)}`;
  if (!(error instanceof Error)) return 'unknown fault';
  const { code } = error as NodeJS.ErrnoException;
  return code !== undefined && CONNECTION.has(code) ? code : error.name;
};

/** Judgement: three tries within what a person waits; the outbox has its own, longer patience. */
const TRIES = 3;
const FIRST_PAUSE_MS = 150;

/** Tries again what may go well the next time. The client itself retries only where it is paused. */
export const trying = async <T>(call: (attempt: number) => Promise<T>): Promise<T> => {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await call(attempt);
    } catch (error) {
      if (attempt >= TRIES || !isPassing(error)) throw error;
      await pause(FIRST_PAUSE_MS * 2 ** (attempt - 1));
    }
  }
};
