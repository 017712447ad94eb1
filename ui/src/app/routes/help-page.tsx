import { Link } from 'react-router-dom';
import { SafetyCaution } from '../../components/caution';
import { PageHeader } from '../../components/page-header';
import { MarkLegend } from '../../features/help/components/mark-legend';
import { RoleList } from '../../features/help/components/role-list';
import { TurnStory } from '../../features/help/components/turn-story';
import { WordList } from '../../features/help/components/word-list';

/** What Stubpost is and how to read it. */
export function HelpPage() {
  return (
    <div className="sp-page sp-reading">
      <PageHeader title="Help" />
      <section className="sp-panel" aria-labelledby="what-it-is">
        <h2 id="what-it-is">What Stubpost is</h2>
        <p>
          A commuter train comes in to a stub-end terminal and stands against the bumping post. In ten to
          thirty minutes a small crew secures it, tests its brakes, changes ends, and leaves again. Stubpost
          shows every such turn while there is still time to act, keeps each act as a record, and counts
          afterwards which trains left on time.
        </p>
        <p>
          The crew records a step in one touch, or the desk does from what it hears on the radio. From what is
          recorded and from the plan Stubpost works out when the train will be ready and how much time is left
          to spare. When the departure is in danger it raises one alert, with what to do and who does it.
        </p>
      </section>
      <SafetyCaution />
      <TurnStory />
      <MarkLegend />
      <WordList />
      <RoleList />
      <p>
        More: <Link to="/keys">Keys</Link>, <Link to="/accessibility">Accessibility</Link>
      </p>
    </div>
  );
}
