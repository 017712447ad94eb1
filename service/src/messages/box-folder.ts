import { createHash } from 'node:crypto';
import { mkdir, open, readdir, readFile, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import { Injectable } from '@nestjs/common';
import type { Instant, MessageChannel } from '@stubpost/shared';
import { Config } from '../config/config';

/** A message as a box holds it. */
export interface BoxItem {
  /** Message-ID of a mail, number of a text message: the same one is kept once, as a mail box does. */
  id: string;
  channel: MessageChannel;
  to: string;
  subject: string;
  text: string;
  /** The whole of it as it came over the wire. */
  raw: string;
  receivedAt: Instant;
}

/** Older ones go when there are more. */
const mostItems = 500;

/** The local boxes as files in the data folder: on disk before they are acknowledged, apart from the database. */
@Injectable()
export class BoxFolder {
  private readonly folder: string;

  constructor(config: Config) {
    this.folder = path.join(config.dataDir, 'boxes');
  }

  async keep(item: BoxItem): Promise<void> {
    await mkdir(this.folder, { recursive: true });
    const names = await this.names();
    const key = createHash('sha256').update(`${item.channel} ${item.id}`).digest('hex').slice(0, 24);
    if (names.some((name) => name.endsWith(`${key}.json`))) return;
    const file = path.join(this.folder, `${String(item.receivedAt).padStart(15, '0')}-${key}.json`);
    const handle = await open(`${file}.part`, 'w', 0o600);
    try {
      await handle.writeFile(JSON.stringify(item));
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(`${file}.part`, file);
    for (const name of names.slice(0, Math.max(0, names.length + 1 - mostItems))) {
      await rm(path.join(this.folder, name), { force: true });
    }
  }

  /** What lies in the boxes, the newest first. */
  async list(): Promise<BoxItem[]> {
    const names = (await this.names()).reverse();
    return Promise.all(
      names.map(async (name) => JSON.parse(await readFile(path.join(this.folder, name), 'utf8')) as BoxItem),
    );
  }

  /** Names begin with the time, so their order is that of arrival. */
  private async names(): Promise<string[]> {
    const names = await readdir(this.folder).catch(() => []);
    return names.filter((name) => name.endsWith('.json')).sort();
  }
}
