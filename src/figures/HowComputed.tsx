import { Disclosure } from '../ui/Disclosure.tsx';
import { levelWords } from './helped-words.ts';

/** The rules behind the numbers, in plain words, with their sources. */
export function HowComputed({ changesShown }: { readonly changesShown: number }) {
  return (
    <Disclosure summary="How this is computed">
      <div className="max-w-measure space-y-3">
        <p>
          <strong className="font-[650]">Pairs.</strong> A firing with the trouble is held against
          the same kiln’s next firing by date, if both started cold or both hot, nothing fired in
          between was left unwritten, and the two compare. Only published notes count. A kiln counts
          once for each change in a season, so that one long series does not outvote the rest.
        </p>
        <p>
          <strong className="font-[650]">The bar</strong> is the range in which the true share
          plausibly lies: Wilson’s 95&nbsp;% interval (Newcombe, Statistics in Medicine 17, 1998,
          857–872). Firings of one member are alike, so n firings count as n ÷ (1 + 0.2·(k − 1)),
          where k is the sum of the squares of each member’s firings, divided by n. With one firing
          a member that is n itself. The 0.2 is our own choice.
        </p>
        <p>
          <strong className="font-[650]">The verdict</strong> compares each change with the firings
          in which no change is named (Newcombe’s interval for a difference, Statistics in Medicine
          17, 1998, 873–890). Many changes looked at together find something by chance, so the level
          is 1 − 0.05/m for m changes shown in a table; with{' '}
          {changesShown === 1 ? 'one' : changesShown} shown here that is {levelWords(changesShown)}.
          “Better” is said only if that interval leaves out nought.
        </p>
        <p>
          <strong className="font-[650]">The order</strong> is by the lower end of the bar. A change
          that can hurt somebody never stands first. Under five firings or three members it is too
          few to say.
        </p>
        <p>
          <strong className="font-[650]">Disputed findings.</strong> An author may disagree with
          what was read off a record. Such a finding leaves every figure at once and is counted as
          disputed, until a moderator has looked and restores it.
        </p>
        <p>
          <strong className="font-[650]">Missing follow-ons.</strong> Whoever gave up may not have
          written again. Beside a share stands what it would be if every firing whose outcome is not
          known had failed.
        </p>
      </div>
    </Disclosure>
  );
}
