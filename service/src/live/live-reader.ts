import type { Response } from 'express';

/** A reader that lets this much pile up is not reading: it is closed, and comes back with its last event. Our choice. */
const stalledBytes = 1024 * 1024;

/** Who listens, and to what. */
export interface LiveReaderFacts {
  terminalCode: string;
  sessionId: string;
}

/** One open stream. */
export class LiveReader {
  /** Highest change this reader has been told of, or began at. */
  lastNumber = 0;
  private open = true;

  constructor(
    readonly facts: LiveReaderFacts,
    private readonly response: Response,
  ) {
    response.status(200).set({
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'private, no-cache, no-store, no-transform',
      'X-Accel-Buffering': 'no',
    });
    response.flushHeaders();
    response.write('retry: 2000\n\n');
  }

  get isOpen(): boolean {
    return this.open;
  }

  /** Sends an event unless the reader has been told of it already. */
  send(number: number, bytes: Buffer): void {
    if (number <= this.lastNumber) return;
    this.lastNumber = number;
    this.write(bytes);
  }

  /** Sends bytes that are no change: beats and reloads. */
  write(bytes: Buffer): void {
    if (!this.open) return;
    if (this.response.writableLength > stalledBytes) {
      this.open = false;
      this.response.destroy();
      return;
    }
    this.response.write(bytes);
  }

  close(): void {
    if (!this.open) return;
    this.open = false;
    this.response.end();
  }

  /** The other side has gone: there is nobody to say goodbye to. */
  leave(): void {
    this.open = false;
  }
}
