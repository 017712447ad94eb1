import { aWireAlert } from '../../../testing/wire-turn';
import { groupAlerts, stripOf } from './group-alerts';

const alert = (id: string, state: Parameters<typeof aWireAlert>[0]) => aWireAlert({ id, ...state });
const raisedAt = (minute: number): string => `2026-03-03T22:${String(minute).padStart(2, '0')}:00.000Z`;

const alerts = [
  alert('closed', { state: 'closed', raisedAt: raisedAt(1) }),
  alert('watch', { priority: 'watch', raisedAt: raisedAt(10) }),
  alert('taken', { state: 'taken', raisedAt: raisedAt(5) }),
  alert('act-now', { priority: 'act-now', raisedAt: raisedAt(20) }),
  alert('older', { raisedAt: raisedAt(12) }),
  alert('newer', { raisedAt: raisedAt(15) }),
  alert('aside', { state: 'set-aside', raisedAt: raisedAt(3) }),
  alert('cleared-early', { state: 'cleared', raisedAt: raisedAt(2) }),
  alert('cleared-late', { state: 'cleared', raisedAt: raisedAt(9) }),
];

describe('groups of alerts', () => {
  it('ask for somebody in this order, most urgent and longest standing first', () => {
    const groups = groupAlerts(alerts).map((group) => [group.key, ...group.alerts.map((one) => one.id)]);
    expect(groups).toEqual([
      ['untaken', 'act-now', 'older', 'newer', 'watch'],
      ['taken', 'taken'],
      ['set-aside', 'aside'],
      ['cleared', 'cleared-late', 'cleared-early'],
      ['closed', 'closed'],
    ]);
  });

  it('leave out what is empty or not asked for', () => {
    expect(groupAlerts(alerts, 'waiting').map((group) => group.key)).toEqual(['cleared']);
    expect(groupAlerts([], 'all')).toEqual([]);
  });
});

describe('the strip above the board', () => {
  it('gives the room to the most urgent alert that nobody has', () => {
    const { foremost, others } = stripOf(alerts);
    expect(foremost?.id).toBe('act-now');
    expect(others.map((one) => one.id)).toEqual(['older', 'newer', 'watch', 'taken', 'aside']);
  });

  it('gives it to nobody when all are taken', () => {
    const { foremost, others } = stripOf(alerts.filter((one) => one.state !== 'raised'));
    expect(foremost).toBeNull();
    expect(others.map((one) => one.id)).toEqual(['taken', 'aside']);
  });
});
