import { existsSync } from 'node:fs';
import { copyFile, mkdir, open, readdir, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import { Injectable } from '@nestjs/common';
import { Config } from '../config/config';

/** Folder into which uploads stream before they are known to be any good. */
export function incomingFolder(config: Config): string {
  return path.join(config.dataDir, 'uploads', 'incoming');
}

/** Uploaded zips on disk, one for each timetable. */
@Injectable()
export class UploadStore {
  private readonly folder: string;
  private readonly incoming: string;

  constructor(config: Config) {
    this.folder = path.join(config.dataDir, 'uploads');
    this.incoming = incomingFolder(config);
  }

  /** Where the zip of a timetable lies. */
  pathOf(timetableId: string): string {
    return path.join(this.folder, `${timetableId}.zip`);
  }

  has(timetableId: string): boolean {
    return existsSync(this.pathOf(timetableId));
  }

  /** Takes an upload over: once this resolves its bytes and its name are on disk. */
  async keep(timetableId: string, incomingPath: string): Promise<void> {
    await mkdir(this.folder, { recursive: true });
    await syncToDisk(incomingPath);
    await moveFile(incomingPath, this.pathOf(timetableId));
    await syncToDisk(this.folder);
  }

  async discard(file: string): Promise<void> {
    await rm(file, { force: true });
  }

  /** Throws away what half-finished uploads of an earlier run have left. */
  async tidy(): Promise<void> {
    await mkdir(this.incoming, { recursive: true });
    for (const name of await readdir(this.incoming)) await this.discard(path.join(this.incoming, name));
  }
}

/** Moves a file, also from another disk; its name stands only once all its bytes do. */
async function moveFile(from: string, to: string): Promise<void> {
  try {
    await rename(from, to);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EXDEV') throw error;
    await copyFile(from, `${to}.part`);
    await syncToDisk(`${to}.part`);
    await rename(`${to}.part`, to);
    await rm(from, { force: true });
  }
}

async function syncToDisk(fileOrFolder: string): Promise<void> {
  const handle = await open(fileOrFolder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
