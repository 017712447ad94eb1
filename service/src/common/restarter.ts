import { AsyncResource } from 'node:async_hooks';
import { Injectable } from '@nestjs/common';

/** Lets a part of the service ask whoever runs it to start it anew in the same process. */
@Injectable()
export class Restarter {
  private handler: (() => void) | undefined;

  /** What `main` does when a restart is asked for. */
  onRequest(handler: () => void): void {
    // Called in the context it comes from: what is started anew is no part of the request that asked for it.
    this.handler = AsyncResource.bind(handler);
  }

  /** Asks for a restart; false when nobody runs the service that could do it. */
  request(): boolean {
    this.handler?.();
    return this.handler !== undefined;
  }
}
