/** A live stream that the test speaks through: `FakeEventSource.last().emit('turn', turn)`. */
export class FakeEventSource extends EventTarget {
  static readonly all: FakeEventSource[] = [];

  /** The stream opened last; a test that expects one fails here when there is none. */
  static last(): FakeEventSource {
    const source = FakeEventSource.all.at(-1);
    if (source === undefined) throw new Error('No live stream was opened');
    return source;
  }

  isClosed = false;

  constructor(readonly url: string) {
    super();
    FakeEventSource.all.push(this);
  }

  close(): void {
    this.isClosed = true;
  }

  emit(name: 'open' | 'turn' | 'alert' | 'beat' | 'reload', data: unknown = {}, lastEventId = ''): void {
    if (this.isClosed) throw new Error('The stream was closed');
    this.dispatchEvent(new MessageEvent(name, { data: JSON.stringify(data), lastEventId }));
  }
}
