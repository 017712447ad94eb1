import { describe, expect, it } from 'vitest';
import { columnsOf } from './entry-columns';

const body = {
  subject: { kind: 'turn', id: 'turn-1' },
  terminal: 'HBR',
  serviceDate: '2026-03-03',
  kind: 'arrival',
  observedAt: '2026-03-03T22:00:00.000Z',
};

describe('the columns of an entry', () => {
  it('say what the body says', () => {
    expect(columnsOf(body)).toEqual({
      subjectKind: 'turn',
      subjectId: 'turn-1',
      kind: 'arrival',
      terminalCode: 'HBR',
      serviceDate: '2026-03-03',
      observedAt: Date.parse('2026-03-03T22:00:00Z'),
    });
  });

  it.each([
    ['no subject', { ...body, subject: null }],
    ['no time', { ...body, observedAt: 'yesterday' }],
    ['no kind', { ...body, kind: 7 }],
    ['nothing', null],
  ])('are not made of a body with %s', (_, broken) => {
    expect(columnsOf(broken)).toBeNull();
  });
});
