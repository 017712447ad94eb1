import { Link } from 'react-router-dom';

/** What was built for, what was checked and how, and what is known not to work yet. */
export function AccessibilityStatement() {
  return (
    <>
      <section className="sp-panel">
        <h2>What it is built to</h2>
        <p>
          Stubpost is built to the Web Content Accessibility Guidelines 2.2, levels A and AA. The railroad
          that runs it decides which law applies to its screens.
        </p>
        <ul className="sp-points">
          <li>
            The table of the board holds every fact of the picture; the picture is hidden from screen readers.
          </li>
          <li>
            Every state has a shape and a word besides its colour. “No colour” under Me shows that this holds.
          </li>
          <li>
            Everything works from the keyboard. All keys are listed under <Link to="/keys">Keys</Link>; single
            letters can be switched off.
          </li>
          <li>Changes are read out together, at most once in ten seconds or as seldom as is set under Me.</li>
          <li>“Act now” is read out at once. It never moves the focus and does not vanish by itself.</li>
          <li>Nothing blinks. Where less motion is asked for, nothing slides.</li>
          <li>No puzzle and no memory test at sign-in; passwords can be pasted and looked at.</li>
          <li>Targets on the phone are 48 pixels or more, on the desk 24 or more.</li>
        </ul>
      </section>
      <section className="sp-panel">
        <h2>How it is checked</h2>
        <p>
          Each version runs an automatic check of its pages for contrast, names and structure, and a test of
          every colour pair under four kinds of colour vision. Automatic checks find only a part of what can
          be wrong.
        </p>
      </section>
      <section className="sp-panel">
        <h2>Known limits</h2>
        <ul className="sp-points">
          <li>
            The picture of the board has no keyboard of its own: use the table beside it, which moves it
            along.
          </li>
          <li>No check has been made yet with a screen reader by ear, with gloves, or in the sun.</li>
          <li>English only.</li>
        </ul>
        <p>Something in the way? Tell the administrator of your railroad; they can pass it on.</p>
      </section>
    </>
  );
}
