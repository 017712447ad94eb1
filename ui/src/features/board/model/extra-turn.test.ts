import { emptyFields, readExtraTurn } from './extra-turn';

const terminal = { code: 'VAR', zone: 'America/New_York' };
const now = Date.parse('2026-03-03T22:26:40Z');
const read = (fields: Partial<typeof emptyFields>) =>
  readExtraTurn({ ...emptyFields, ...fields }, terminal, now);

describe('an extra turn as typed', () => {
  it('is read on the terminal’s clock', () => {
    expect(
      read({ inboundTrain: ' 9731 ', arrives: '1735', outboundTrain: '9742', leaves: '17:50', track: '3' }),
    ).toEqual({
      ok: true,
      request: {
        terminal: 'VAR',
        serviceDate: '2026-03-03',
        track: '3',
        inbound: { train: '9731', scheduledArrivalAt: '2026-03-03T22:35:00.000Z' },
        outbound: { train: '9742', scheduledDepartureAt: '2026-03-03T22:50:00.000Z' },
      },
    });
  });

  it('may lie in the past, and may be a first-out or a tie-up', () => {
    const firstOut = read({ outboundTrain: '9742', leaves: '17:10' });
    expect(firstOut.ok && firstOut.request.outbound?.scheduledDepartureAt).toBe('2026-03-03T22:10:00.000Z');
    const tieUp = read({ inboundTrain: '9731', arrives: '17:10' });
    expect(tieUp.ok && tieUp.request.outbound).toBeUndefined();
  });

  it('runs across midnight on the service day of its arrival', () => {
    const late = readExtraTurn(
      { ...emptyFields, inboundTrain: '9731', arrives: '23:50', outboundTrain: '9742', leaves: '0:10' },
      terminal,
      Date.parse('2026-03-04T04:30:00Z'),
    );
    expect(late.ok && late.request).toMatchObject({
      serviceDate: '2026-03-03',
      inbound: { scheduledArrivalAt: '2026-03-04T04:50:00.000Z' },
      outbound: { scheduledDepartureAt: '2026-03-04T05:10:00.000Z' },
    });
  });

  it.each([
    [{}, ['outboundTrain']],
    [{ inboundTrain: '9731' }, ['arrives']],
    [{ leaves: '17:40' }, ['outboundTrain']],
    [{ outboundTrain: '9742', leaves: 'soon' }, ['leaves']],
    [{ inboundTrain: '9731', arrives: '17:40', outboundTrain: '9742', leaves: '17:30' }, ['leaves']],
  ])('names what is missing or wrong: %j', (fields, wrong) => {
    const result = read(fields);
    expect(result.ok ? [] : result.faults.map((fault) => fault.field)).toEqual(wrong);
  });
});
