import type { Response } from 'express';
import { LiveReader } from './live-reader';

/** A response that counts what is written to it; `waiting` is what its other side has not read. */
class FakeResponse {
  waiting = 0;
  written: string[] = [];
  isDestroyed = false;
  isEnded = false;

  get writableLength(): number {
    return this.waiting;
  }

  status(): this {
    return this;
  }

  set(): this {
    return this;
  }

  flushHeaders(): void {}

  write(bytes: Buffer | string): void {
    this.written.push(bytes.toString());
  }

  end(): void {
    this.isEnded = true;
  }

  destroy(): void {
    this.isDestroyed = true;
  }
}

describe('a reader of a live stream', () => {
  const open = () => {
    const response = new FakeResponse();
    const reader = new LiveReader({ terminalCode: 'HBR', sessionId: 's' }, response as unknown as Response);
    response.written = [];
    return { response, reader };
  };

  test('is told of each change once', () => {
    const { response, reader } = open();
    for (const number of [1, 2, 2, 1, 3]) reader.send(number, Buffer.from(`${number}`));
    expect(response.written).toEqual(['1', '2', '3']);
  });

  test('that does not read is let go, and memory stays as it was', () => {
    const { response, reader } = open();
    response.waiting = 1024 * 1024;
    reader.send(1, Buffer.from('1'));
    expect(response.isDestroyed).toBe(false);
    response.waiting += 1;
    for (const number of [2, 3, 4]) reader.send(number, Buffer.from(`${number}`));
    expect(response).toMatchObject({ isDestroyed: true, written: ['1'] });
    expect(reader.isOpen).toBe(false);
  });

  test('hears nothing after it was closed', () => {
    const { response, reader } = open();
    reader.close();
    reader.write(Buffer.from('late'));
    expect(response).toMatchObject({ isEnded: true, written: [] });
  });
});
