import { ERROR_STATUSES, type ErrorCode } from '@stubpost/shared';

/** What a refusal is made of; the status follows from the code. */
export interface RefusalParts {
  code: ErrorCode;
  message: string;
  facts?: Record<string, unknown>;
}

/** An expected "no" on its way to the caller. One filter turns it into the answer. */
export class Refusal extends Error {
  readonly status: number;
  readonly code: ErrorCode;
  readonly facts: Record<string, unknown>;

  constructor(parts: RefusalParts) {
    super(parts.message);
    this.code = parts.code;
    this.status = ERROR_STATUSES[parts.code];
    this.facts = parts.facts ?? {};
  }
}
