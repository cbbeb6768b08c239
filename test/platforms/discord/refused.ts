/** A call that Discord does not take: topics/opcodes-and-status-codes. */
export class Refused extends Error {
  readonly status: number;
  readonly code: number;

  constructor(status: number, code: number, message: string) {
    super(message);
    this.status = status;
    this.code = code;
  }
}
