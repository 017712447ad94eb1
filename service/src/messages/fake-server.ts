import type { BoxItem } from './box-folder';

/** A stand-in that listens on a loopback port. */
export interface FakeServer {
  port: number;
  close(): Promise<void>;
}

/** What a stand-in needs: where it listens, and the box behind it. */
export interface FakeOptions {
  /** 0 leaves the choice to the system. */
  port: number;
  keep: (item: Omit<BoxItem, 'receivedAt'>) => Promise<void>;
  list: () => Promise<BoxItem[]>;
}
