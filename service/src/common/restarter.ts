import { Injectable } from '@nestjs/common';

/** Lets a part of the service ask whoever runs it to start it anew in the same process. */
@Injectable()
export class Restarter {
  private handler: (() => void) | undefined;

  /** What `main` does when a restart is asked for. */
  onRequest(handler: () => void): void {
    this.handler = handler;
  }

  /** Asks for a restart; false when nobody runs the service that could do it. */
  request(): boolean {
    this.handler?.();
    return this.handler !== undefined;
  }
}
