import { notLiveAfterSeconds, type WireAlert, type WireTurn } from '@stubpost/shared';
import { noteServerTime, readDeviceClock, readNow } from './use-now';

/** How the stream of a terminal stands. */
export interface LiveState {
  live: boolean;
  /** When the server was last heard; null before the first word. */
  lastWordAt: number | null;
  /** Seconds until the next try; 0 while live or while one is under way. */
  retryInSeconds: number;
}

/** What comes over the stream. */
export type LiveMessage =
  | { kind: 'turn'; turn: WireTurn }
  | { kind: 'alert'; alert: WireAlert }
  | { kind: 'reload' }
  | { kind: 'poll' };

const retrySeconds = 5;
const pollSeconds = 15;

/** The part of EventSource that is used; tests bring their own. */
export type OpenStream = (url: string) => EventSource;

/** Words of one event: the object stands beside its id and version, or under its own name. */
function objectIn<T>(data: unknown, name: 'turn' | 'alert'): T | null {
  if (typeof data !== 'object' || data === null) return null;
  const inner = (data as Record<string, unknown>)[name];
  const found = (typeof inner === 'object' && inner !== null ? inner : data) as Record<string, unknown>;
  return typeof found['id'] === 'string' && typeof found['state'] === 'string' ? (found as T) : null;
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

/**
 * One live stream of one terminal. The browser's EventSource resumes by itself after a short break. When nothing has
 * come for ten seconds the stream counts as lost: it is opened anew every few seconds, from the last change that was seen,
 * and what is on screen is asked for every 15 s meanwhile.
 */
export class LiveStream {
  private state: LiveState = { live: false, lastWordAt: null, retryInSeconds: 0 };
  private source: EventSource | null = null;
  private timer: ReturnType<typeof setInterval> | undefined;
  private silentSince = 0;
  private lostAt: number | null = null;
  private polledAt = 0;
  private lastEventId = '';
  private readonly watchers = new Set<() => void>();

  constructor(
    private readonly terminal: string,
    private readonly take: (message: LiveMessage) => void,
    private readonly open: OpenStream = (url) => new EventSource(url),
  ) {}

  start(): void {
    this.silentSince = readDeviceClock();
    this.connect();
    this.timer = setInterval(() => this.look(), 1000);
  }

  stop(): void {
    clearInterval(this.timer);
    this.source?.close();
    this.source = null;
  }

  snapshot = (): LiveState => this.state;

  watch = (listener: () => void): (() => void) => {
    this.watchers.add(listener);
    return () => this.watchers.delete(listener);
  };

  /** A poll of our own brought an answer: the server is there, though the stream is not. */
  noteAnswer(): void {
    this.set({ lastWordAt: readNow() });
  }

  private connect(): void {
    this.source?.close();
    const question = new URLSearchParams({ terminal: this.terminal });
    if (this.lastEventId !== '') question.set('lastEventId', this.lastEventId);
    const source = this.open(`/api/live?${question.toString()}`);
    this.source = source;
    source.addEventListener('beat', (event) => this.onBeat(event));
    source.addEventListener('turn', (event) => this.onObject('turn', event));
    source.addEventListener('alert', (event) => this.onObject('alert', event));
    source.addEventListener('reload', (event) => {
      this.noteId(event);
      this.heard({ kind: 'reload' });
    });
    source.addEventListener('open', () => this.heard(null));
  }

  /** Every event says how far the stream has come, also a beat. */
  private noteId(event: MessageEvent): void {
    if (event.lastEventId !== '') this.lastEventId = event.lastEventId;
  }

  private onBeat(event: MessageEvent): void {
    this.noteId(event);
    const now = (parse(event.data as string) as { now?: unknown } | null)?.now;
    const server = typeof now === 'string' ? Date.parse(now) : Number.NaN;
    // The words were on their way for an unknown but short time.
    if (!Number.isNaN(server)) {
      const ahead = server - readDeviceClock();
      noteServerTime({ earliest: ahead, latest: ahead + 500 });
    }
    this.heard(null);
  }

  private onObject(kind: 'turn' | 'alert', event: MessageEvent): void {
    const data = parse(event.data as string);
    this.noteId(event);
    if (kind === 'turn') {
      const turn = objectIn<WireTurn>(data, 'turn');
      this.heard(turn === null ? null : { kind, turn });
    } else {
      const alert = objectIn<WireAlert>(data, 'alert');
      this.heard(alert === null ? null : { kind, alert });
    }
  }

  private heard(message: LiveMessage | null): void {
    const wasLost = this.lostAt !== null;
    this.silentSince = readDeviceClock();
    this.lostAt = null;
    this.set({ live: true, lastWordAt: readNow(), retryInSeconds: 0 });
    // A stream that does not know where it stopped starts at the present: what happened in between is asked for.
    if (wasLost && this.lastEventId === '') this.take({ kind: 'reload' });
    if (message !== null) this.take(message);
  }

  /** Once a second: is the stream still there, and if not, what is next. */
  private look(): void {
    const now = readDeviceClock();
    if (now - this.silentSince < notLiveAfterSeconds * 1000) return;
    if (this.lostAt === null) {
      this.lostAt = now;
      this.polledAt = 0;
      this.source?.close();
    }
    const sinceLost = Math.floor((now - this.lostAt) / 1000);
    const left = retrySeconds - (sinceLost % retrySeconds);
    if (sinceLost > 0 && left === retrySeconds) this.connect();
    if (now - this.polledAt >= pollSeconds * 1000) {
      this.polledAt = now;
      this.take({ kind: 'poll' });
    }
    this.set({ live: false, retryInSeconds: left });
  }

  private set(change: Partial<LiveState>): void {
    const next = { ...this.state, ...change };
    const isSame =
      next.live === this.state.live &&
      next.retryInSeconds === this.state.retryInSeconds &&
      Math.floor((next.lastWordAt ?? 0) / 1000) === Math.floor((this.state.lastWordAt ?? 0) / 1000);
    if (isSame) return;
    this.state = next;
    for (const watcher of this.watchers) watcher();
  }
}
