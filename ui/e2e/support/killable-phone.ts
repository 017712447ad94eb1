import { spawn } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { chromium, type BrowserContext, type Page } from 'playwright-core';
import { chromiumPath, launchArguments, phone } from './browser';

/** A phone of its own: a browser with a folder that stays, which can be killed as a phone's flat battery would. */
export interface KillablePhone {
  /** Switches it on and gives its page, empty; addresses without a server are meant at `baseURL`. */
  start: (baseURL: string) => Promise<Page>;
  /** Ends it hard, in the middle of whatever it does. */
  kill: () => Promise<void>;
  /** Takes the signal away, or gives it back. */
  setOffline: (isOffline: boolean) => Promise<void>;
  /** Switches it off and throws its folder away. */
  discard: () => Promise<void>;
}

/** The clock of every page of the phone, ahead of the machine's by so many milliseconds. */
function wrongClock(aheadMilliseconds: number): void {
  const RightDate = Date;
  const wrongNow = (): number => RightDate.now() + aheadMilliseconds;
  class WrongDate extends RightDate {
    constructor(...parts: [] | [number | string]) {
      if (parts.length === 0) super(wrongNow());
      else super(...parts);
    }

    static override now(): number {
      return wrongNow();
    }
  }
  globalThis.Date = WrongDate as DateConstructor;
}

async function debuggingAddress(folder: string): Promise<string> {
  for (let attempt = 0; attempt < 300; attempt += 1) {
    const port = await readFile(path.join(folder, 'DevToolsActivePort'), 'utf8').catch(() => '');
    if (port.includes('\n')) return `http://127.0.0.1:${port.split('\n')[0]}`;
    await pause(100);
  }
  throw new Error('the browser did not come up');
}

/** A window that was there before us knows no base address: it is put before each path. */
function withBase(page: Page, baseURL: string): Page {
  const goto = page.goto.bind(page);
  page.goto = (url, options) => goto(url.startsWith('/') ? baseURL + url : url, options);
  return page;
}

/** A phone that is switched off. Its clock is wrong by so much. */
export async function makePhone(clockAheadMilliseconds: number): Promise<KillablePhone> {
  const folder = await mkdtemp(path.join(tmpdir(), 'stubpost-phone-'));
  let end: (() => Promise<void>) | null = null;
  let context: BrowserContext | null = null;
  let isOffline = false;

  const kill = async (): Promise<void> => {
    context = null;
    await end?.();
    end = null;
  };
  return {
    start: async (baseURL) => {
      await rm(path.join(folder, 'DevToolsActivePort'), { force: true });
      const child = spawn(
        chromiumPath,
        [
          ...launchArguments,
          '--headless=new',
          `--user-data-dir=${folder}`,
          '--remote-debugging-port=0',
          'about:blank',
        ],
        { stdio: 'ignore', detached: true },
      );
      const gone = new Promise<void>((resolve) => child.once('exit', () => resolve()));
      end = async () => {
        // The whole group: the browser's own helpers go with it, none is given time to put things in order.
        if (child.pid !== undefined) process.kill(-child.pid, 'SIGKILL');
        await gone;
      };
      const browser = await chromium.connectOverCDP(await debuggingAddress(folder));
      const opened = browser.contexts()[0];
      if (opened === undefined) throw new Error('the browser has no window');
      context = opened;
      await context.addInitScript(wrongClock, clockAheadMilliseconds);
      const page = context.pages()[0] ?? (await context.newPage());
      await page.setViewportSize(phone);
      await context.setOffline(isOffline);
      return withBase(page, baseURL);
    },
    kill,
    setOffline: async (next) => {
      isOffline = next;
      await context?.setOffline(next);
    },
    discard: async () => {
      await kill();
      await rm(folder, { recursive: true, force: true, maxRetries: 5, retryDelay: 200 });
    },
  };
}
