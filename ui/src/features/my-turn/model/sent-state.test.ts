import type { OutboxEntry } from '../../../lib/outbox/outbox-entry';
import type { WireAlert, WireEntry } from '@stubpost/shared';
import { at, aWireTurn, ms } from '../testing/a-wire-turn';
import { anOutboxEntry, anOutboxState as queue } from '../../../testing/an-outbox';
import { seenByDeskAt, sentState } from './sent-state';

const waiting = (refusal: OutboxEntry['refusal']): OutboxEntry => anOutboxEntry({ refusal });
const entry = (personId: string, receivedAt: string): WireEntry => ({
  sequence: 1,
  hash: 'h',
  id: 'e',
  kind: 'note',
  observedAt: receivedAt,
  receivedAt,
  source: 'by-hand',
  by: { id: personId, name: personId },
});

describe('where the entries are', () => {
  it('says first what was refused, then what is not sent', () => {
    const refused = waiting({ code: 'entry.not_yours', message: 'no' });
    expect(sentState(queue({ waiting: [waiting(null), refused] }), null)).toEqual({
      kind: 'refused',
      count: 1,
    });
    expect(sentState(queue({ waiting: [waiting(null), waiting(null)] }), null)).toEqual({
      kind: 'on-phone',
      count: 2,
    });
    expect(sentState(queue({}), ms('17:22'))).toEqual({ kind: 'none' });
  });

  it('is sent with the receipt, and seen only by an act of the desk after it', () => {
    const sent = queue({ sentAt: ms('17:22:43') });
    expect(sentState(sent, null)).toEqual({ kind: 'sent', at: ms('17:22:43') });
    expect(sentState(sent, ms('17:20'))).toEqual({ kind: 'sent', at: ms('17:22:43') });
    expect(sentState(sent, ms('17:23'))).toEqual({ kind: 'seen', at: ms('17:23') });
  });

  it('takes an alert taken or an entry of somebody else as seen, never the crew’s own entries', () => {
    expect(seenByDeskAt(aWireTurn(), [entry('p-ortiz', at('17:22'))])).toBeNull();
    expect(seenByDeskAt(aWireTurn(), [entry('p-desk', at('17:21')), entry('p-ortiz', at('17:22'))])).toBe(
      ms('17:21'),
    );
    const alert = { takenAt: at('17:25') } as WireAlert;
    expect(seenByDeskAt(aWireTurn({ alerts: [alert] }), [entry('p-desk', at('17:21'))])).toBe(ms('17:25'));
  });
});
