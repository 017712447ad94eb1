import { Injectable, Logger, type OnModuleDestroy, type OnModuleInit } from '@nestjs/common';
import { beatSeconds, formatInstant, may } from '@stubpost/shared';
import type { Response } from 'express';
import type { Subscription } from 'rxjs';
import { SessionEndings } from '../auth/session-endings';
import { SessionsService } from '../auth/sessions.service';
import { Clock } from '../common/clock';
import { type Change, ChangeFeed } from '../database/change-log';
import { ChangeHistory } from './change-history';
import { liveEventBytes } from './live-event';
import { LiveObjects } from './live-objects';
import { LiveReader, type LiveReaderFacts } from './live-reader';

/** Sessions behind open streams are looked at this often, so that one that ended elsewhere is noticed in time. */
const sessionCheckBeats = 6;

/**
 * Every open stream. Changes go out in the order of their numbers, each made into bytes once for all readers of its
 * terminal; a reader that comes back is told what it missed in the same queue, so that nothing falls between.
 */
@Injectable()
export class LiveHub implements OnModuleInit, OnModuleDestroy {
  private readonly logger = new Logger(LiveHub.name);
  private readonly readers = new Set<LiveReader>();
  private readonly subscriptions: Subscription[] = [];
  private tail: Promise<void> = Promise.resolve();
  /** The newest change that has gone out; a beat never names one that is still to come. */
  private newest = 0;
  private beats = 0;
  private timer: NodeJS.Timeout | undefined;

  constructor(
    private readonly feed: ChangeFeed,
    private readonly history: ChangeHistory,
    private readonly objects: LiveObjects,
    private readonly sessions: SessionsService,
    private readonly endings: SessionEndings,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.enqueue(async () => {
      this.newest = await this.history.newest();
    });
    this.subscriptions.push(
      this.feed.changes.subscribe((change) => this.enqueue(() => this.publish(change))),
      this.endings.ended.subscribe((sessionId) => this.closeWhere((facts) => facts.sessionId === sessionId)),
    );
    this.timer = setInterval(() => this.enqueue(() => this.beat()), beatSeconds * 1000);
    this.timer.unref();
  }

  onModuleDestroy(): void {
    clearInterval(this.timer);
    for (const subscription of this.subscriptions) subscription.unsubscribe();
    this.closeWhere(() => true);
  }

  /** How many streams are open. */
  get readerCount(): number {
    return this.readers.size;
  }

  /** Opens a stream; with the number of the last change that was seen it goes on from there. */
  open(facts: LiveReaderFacts, response: Response, lastNumber: number | null): void {
    const reader = new LiveReader(facts, response);
    response.on('close', () => {
      reader.leave();
      this.readers.delete(reader);
    });
    this.enqueue(() => this.admit(reader, lastNumber));
  }

  /** Resolves when everything that has happened up to now has been sent. */
  async settled(): Promise<void> {
    await this.tail;
  }

  private enqueue(work: () => Promise<void>): void {
    this.tail = this.tail.then(work).catch((error: unknown) => {
      this.logger.error(`live stream: ${error instanceof Error ? error.stack : String(error)}`);
    });
  }

  private async admit(reader: LiveReader, lastNumber: number | null): Promise<void> {
    if (!reader.isOpen) return;
    const newest = Math.max(this.newest, await this.history.newest());
    const missed = lastNumber === null ? [] : await this.history.since(reader.facts.terminalCode, lastNumber);
    if (missed === null) reader.write(this.reloadBytes(newest));
    for (const change of missed ?? []) reader.send(change.number, await this.bytesOf(change));
    reader.lastNumber = Math.max(reader.lastNumber, newest);
    reader.write(this.beatBytes(reader.lastNumber));
    if (reader.isOpen) this.readers.add(reader);
  }

  private async publish(change: Change): Promise<void> {
    this.newest = Math.max(this.newest, change.number);
    const readers = [...this.readers].filter((reader) => reader.facts.terminalCode === change.terminalCode);
    if (readers.length === 0) return;
    const bytes = await this.bytesOf(change);
    for (const reader of readers) reader.send(change.number, bytes);
  }

  private async bytesOf(change: Pick<Change, 'number' | 'kind' | 'objectId'>): Promise<Buffer> {
    if (change.kind === 'turn' || change.kind === 'alert') {
      const json = await this.objects.jsonOf(change.kind, change.objectId);
      if (json !== null) return liveEventBytes(change.kind, change.number, json);
    }
    return this.reloadBytes(change.number);
  }

  private reloadBytes(number: number): Buffer {
    return liveEventBytes('reload', number, '{}');
  }

  private beatBytes(number: number): Buffer {
    return liveEventBytes('beat', number, JSON.stringify({ now: formatInstant(this.clock.now()) }));
  }

  private async beat(): Promise<void> {
    this.beats += 1;
    const bytes = this.beatBytes(this.newest);
    for (const reader of this.readers) reader.write(bytes);
    if (this.beats % sessionCheckBeats === 0) await this.checkSessions();
  }

  /** Closes streams whose session has ended or whose person may not look at the terminal any more. */
  async checkSessions(): Promise<void> {
    for (const sessionId of new Set([...this.readers].map((reader) => reader.facts.sessionId))) {
      const person = await this.sessions.resolve(sessionId);
      this.closeWhere(
        (facts) =>
          facts.sessionId === sessionId &&
          (person === null || !may(person, 'board.read', facts.terminalCode)),
      );
    }
  }

  private closeWhere(matches: (facts: LiveReaderFacts) => boolean): void {
    for (const reader of [...this.readers]) {
      if (!matches(reader.facts)) continue;
      reader.close();
      this.readers.delete(reader);
    }
  }
}
