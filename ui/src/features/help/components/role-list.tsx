import { ROLES, type Role } from '@stubpost/shared';
import { ROLE_WORDS } from '../../../components/words';
import { HOME_NAMES, homeOfRole } from '../../../lib/home';

const DOES: Record<Role, string> = {
  conductor:
    'records the steps of own turns on the phone, takes back own entries before departure and asks for corrections after it; answers the desk, reports defects, hands over, ties sets up',
  engineer:
    'the same away from the controls; at the controls the conductor, the desk or a later entry does it',
  dispatcher:
    'records for everybody what comes over the radio; tracks, holds, extras, annulments; takes alerts',
  supervisor:
    'takes alerts, decides on corrections of others, writes notes, and edits step plans and thresholds',
  inspector: 'puts blue signals up and takes them down, on the phone too; reports defects, writes notes',
  planner: 'reads board and history',
  analyst: 'reads history and brings in past departures',
  auditor: 'reads everything that is recorded',
  administrator: 'people and roles, terminals and tracks, timetables; records nothing about trains',
};

/** Who does what, and where each starts. */
export function RoleList() {
  return (
    <section className="sp-panel" aria-labelledby="roles">
      <h2 id="roles">What each role does</h2>
      <div className="sp-table-scroll" role="region" aria-label="Roles" tabIndex={0}>
        <table className="sp-table sp-stack">
          <thead>
            <tr>
              <th scope="col">Role</th>
              <th scope="col">Starts at</th>
              <th scope="col">Does</th>
            </tr>
          </thead>
          <tbody>
            {ROLES.map((role) => (
              <tr key={role}>
                <th scope="row">{ROLE_WORDS[role]}</th>
                <td data-head="Starts at" className="nowrap">
                  {HOME_NAMES[homeOfRole(role)]}
                </td>
                <td data-head="Does">{DOES[role]}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p>A person can have several roles, each at one terminal or at all. The administrator gives them.</p>
    </section>
  );
}
