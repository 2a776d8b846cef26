import { Disclosure } from '../ui/Disclosure.tsx';

/** What a member agrees to, in words that need no lawyer. */
export function HouseRules() {
  return (
    <div className="border-y border-line py-2">
      <Disclosure summary="The house rules">
        <ul className="max-w-measure list-['–_'] space-y-1.5 pl-4">
          <li>Write about firings you were at. What went wrong is worth as much as what worked.</li>
          <li>
            Say what you measured and what you guessed, and leave blank what you do not know. A note
            with gaps is welcome; a made-up figure spoils everyone’s.
          </li>
          <li>
            Show pictures you took, or have leave to show. Nobody who did not agree to it is in
            them.
          </li>
          <li>
            Talk about kilns and changes, not about people. Nothing is sold here, and nothing is
            advertised.
          </li>
          <li>
            Never tell others to leave out a flame guard, a regulator or ventilation. A moderator
            reads each note before it is published, and may send it back with a reason.
          </li>
          <li>Who keeps breaking these may be shut out, and is told why.</li>
        </ul>
      </Disclosure>
      <Disclosure summary="The licence of published notes">
        <div className="max-w-measure space-y-2">
          <p>
            Your notes stay yours. For a note you publish, you let Spyhole show it: its words,
            readings, pictures and record, and the figures that are worked out from it together with
            others.
          </p>
          <p>
            You let others read it, quote it and use its readings, with your name and a link to the
            note. They may not sell it as their own work. Whoever does more than that has to ask
            you.
          </p>
          <p>
            When you ask for a note to be taken down it leaves the pages and the figures. What
            others have quoted by then stays quoted. Drafts are read by nobody but you.
          </p>
        </div>
      </Disclosure>
    </div>
  );
}
