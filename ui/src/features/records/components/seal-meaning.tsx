/** What the chain proves and what it cannot: nobody should lean on it for more. */
export function SealMeaning() {
  return (
    <section className="sp-panel" aria-labelledby="seal-meaning">
      <h2 id="seal-meaning">What a seal proves, and what it does not</h2>
      <p>
        Each entry gets a number, the time at which it came in, and a hash over all of its fields, who and
        when included, and over the hash of the entry before it. So the entries form a chain.
      </p>
      <h3>It shows</h3>
      <ul className="sp-points">
        <li>that an entry was changed, however little, taken out, added, doubled or moved, and which one;</li>
        <li>that the tail was cut off or the whole chain made anew, once a head is known from elsewhere;</li>
        <li>in which order the entries came in, and by this server’s clock when.</li>
      </ul>
      <h3>It does not show</h3>
      <ul className="sp-points">
        <li>that what somebody wrote is true, or that the clock of a device was right;</li>
        <li>that something was left out which nobody ever recorded;</li>
        <li>anything about entries newer than the last head that was kept outside this server;</li>
        <li>
          that a train is or was safe to move: the railroad’s rules, the law and qualified people decide.
        </li>
      </ul>
    </section>
  );
}
