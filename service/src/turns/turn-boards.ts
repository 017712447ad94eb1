import { promisify } from 'node:util';
import { gzip } from 'node:zlib';
import { randomUUID } from 'node:crypto';
import { Injectable, type OnModuleDestroy, type OnModuleInit } from '@nestjs/common';
import { type BoardQuery, type Instant, formatInstant } from '@stubpost/shared';
import type { Subscription } from 'rxjs';
import { ChangeFeed } from '../database/change-log';
import { TerminalsReadModel } from '../terminals/terminals.read-model';
import { TurnBoardReadModel, boardRangeOf } from './turn-board.read-model';
import { TurnFiles } from './turn-files';
import { TurnViews, viewMilliseconds } from './turn-views';

const compress = promisify(gzip);

/** Boards in memory; the one not asked for longest goes first. Our choice: a few per terminal. */
const boardsKept = 24;

/** A board as it is sent. Body and compressed body are made when somebody first wants them. */
export class BoardSnapshot {
  private plain: Buffer | undefined;
  private packed: Promise<Buffer> | undefined;

  constructor(
    readonly facts: {
      terminal: string;
      etag: string;
      /** Number of changes of the terminal before it was read. */
      generation: number;
      /** Stretch of 5 s for which it is good. */
      stretch: number;
      now: Instant;
      turns: readonly string[];
    },
  ) {}

  get body(): Buffer {
    const { now, terminal, turns } = this.facts;
    this.plain ??= Buffer.from(
      `{"now":"${formatInstant(now)}","terminal":${JSON.stringify(terminal)},"turns":[${turns.join(',')}]}`,
    );
    return this.plain;
  }

  get gzip(): Promise<Buffer> {
    this.packed ??= compress(this.body);
    return this.packed;
  }
}

/**
 * Boards, each put together once for all who ask. One is good until something changes at its terminal, and for 5 s at
 * most; while it is, the question costs no query, and an unchanged board keeps its tag for as long as it is unchanged.
 */
@Injectable()
export class TurnBoards implements OnModuleInit, OnModuleDestroy {
  private readonly generations = new Map<string, number>();
  private readonly snapshots = new Map<string, BoardSnapshot>();
  private readonly building = new Map<string, Promise<BoardSnapshot>>();
  /** Tags of an earlier run of the service must not be taken for ours. */
  private readonly run = randomUUID().slice(0, 8);
  private made = 0;
  private subscription: Subscription | undefined;

  constructor(
    private readonly readModel: TurnBoardReadModel,
    private readonly files: TurnFiles,
    private readonly views: TurnViews,
    private readonly terminals: TerminalsReadModel,
    private readonly feed: ChangeFeed,
  ) {}

  onModuleInit(): void {
    this.subscription = this.feed.changes.subscribe(({ terminalCode }) => {
      this.generations.set(terminalCode, this.generationOf(terminalCode) + 1);
    });
  }

  onModuleDestroy(): void {
    this.subscription?.unsubscribe();
  }

  /** The board that a question asks for, as it is at a moment. */
  async find(query: BoardQuery, now: Instant): Promise<BoardSnapshot> {
    const key = [query.terminal, query.serviceDate, query.from, query.to].join('|');
    const generation = this.generationOf(query.terminal);
    const stretch = Math.floor(now / viewMilliseconds);
    const known = this.snapshots.get(key);
    if (known?.facts.generation === generation && known.facts.stretch === stretch) return known;
    const work = `${key}|${generation}|${stretch}`;
    const building = this.building.get(work) ?? this.build({ key, query, generation, stretch, now });
    this.building.set(work, building);
    try {
      return await building;
    } finally {
      this.building.delete(work);
    }
  }

  private generationOf(terminal: string): number {
    return this.generations.get(terminal) ?? 0;
  }

  private async build(question: {
    key: string;
    query: BoardQuery;
    generation: number;
    stretch: number;
    now: Instant;
  }): Promise<BoardSnapshot> {
    const { key, query, generation, stretch, now } = question;
    const { terminal } = query;
    await this.terminals.require(terminal);
    const versions = await this.readModel.find(terminal, boardRangeOf(query, now));
    const files = await this.files.findAll(versions);
    const turns: string[] = [];
    for (const { id } of versions) {
      const file = files.get(id);
      if (file !== undefined) turns.push(await this.views.jsonOf(file, now));
    }
    const before = this.snapshots.get(key);
    const etag =
      before !== undefined && isSame(before.facts.turns, turns) ? before.facts.etag : this.nextTag();
    const snapshot = new BoardSnapshot({ terminal, etag, generation, stretch, now, turns });
    this.keep(key, snapshot);
    return snapshot;
  }

  private nextTag(): string {
    this.made += 1;
    return `W/"${this.run}-${this.made}"`;
  }

  private keep(key: string, snapshot: BoardSnapshot): void {
    this.snapshots.delete(key);
    this.snapshots.set(key, snapshot);
    if (this.snapshots.size <= boardsKept) return;
    const [oldest] = this.snapshots.keys();
    if (oldest !== undefined) this.snapshots.delete(oldest);
  }
}

function isSame(a: readonly string[], b: readonly string[]): boolean {
  return a.length === b.length && a.every((text, index) => text === b[index]);
}
