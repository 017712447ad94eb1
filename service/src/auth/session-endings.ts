import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import { type Observable, Subject } from 'rxjs';

/** Tells at once which sessions have ended, so that open streams of those can be closed. */
@Injectable()
export class SessionEndings implements OnModuleDestroy {
  private readonly subject = new Subject<string>();
  readonly ended: Observable<string> = this.subject.asObservable();

  publish(sessionIds: readonly string[]): void {
    for (const id of sessionIds) this.subject.next(id);
  }

  onModuleDestroy(): void {
    this.subject.complete();
  }
}
