import type { RefObject } from 'react';
import type { DeskNote } from '#shared/api/desk.ts';
import type { Units } from '#shared/units/units.ts';
import { Button } from '../ui/Button.tsx';
import { Disclosure } from '../ui/Disclosure.tsx';
import { Icon } from '../ui/Icon.tsx';
import { actWords } from './desk-words.ts';
import { FindingList } from '../notes/FindingList.tsx';
import { momentWords } from '../notes/note-words.ts';
import { rangesIn } from './passage-ranges.ts';
import { pinWords } from './remark-pins.ts';

interface Props {
  readonly data: DeskNote;
  readonly units: Units;
  readonly noteRef: RefObject<Element | null>;
  /** Pins a new remark to a field; null where one may not remark. */
  readonly onRemark: ((pointer: string) => void) | null;
}

/** What the server read off the note: unsafe words first, then the author's answers, then the rest. */
export function WhatToLookAt({ data, units, noteRef, onRemark }: Props) {
  const asked = data.checks.filter(({ code }) => code !== 'unsafe-practice');
  return (
    <section aria-labelledby="look-at" className="space-y-5">
      <h2 id="look-at" className="text-section">
        To look at
      </h2>
      {data.unsafe.length > 0 && (
        <div className="space-y-2">
          <h3 className="text-small font-[650]">Words that may tell of something unsafe</h3>
          <ul className="border-t border-caution text-small">
            {data.unsafe.map(({ passage, reason }) => (
              <li key={reason} className="space-y-1 border-b border-line py-2">
                <p className="flex gap-2 text-caution">
                  <Icon name="look-again" className="mt-0.5 size-4.5" />
                  <span>{reason}</span>
                </p>
                {passage !== '' && (
                  <Button
                    kind="quiet"
                    label={`Show where it stands: ${passage}`}
                    onClick={() => showPassage(noteRef.current, passage)}
                  >
                    Show where it stands
                  </Button>
                )}
              </li>
            ))}
          </ul>
        </div>
      )}
      <div className="space-y-2">
        <h3 className="text-small font-[650]">Checks, as the author answered them</h3>
        {asked.length === 0 ? (
          <p className="text-small text-soot-2">None was open.</p>
        ) : (
          <ul className="border-t border-soot-2 text-small">
            {asked.map((check) => (
              <li
                key={`${check.code}${check.pointer}`}
                className="space-y-1 border-b border-line py-2"
              >
                <p>{check.text}</p>
                <p>
                  <span className="text-soot-2">Answer: </span>
                  {check.answer ? `“${check.answer}”` : 'none'}
                </p>
                {onRemark && (
                  <Button
                    kind="quiet"
                    label={`Remark on this: ${pinWords(check.pointer)}`}
                    onClick={() => onRemark(check.pointer)}
                  >
                    Remark on this
                  </Button>
                )}
              </li>
            ))}
          </ul>
        )}
      </div>
      <div className="space-y-2">
        <h3 className="text-small font-[650]">Found in it</h3>
        {data.findings.length === 0 ? (
          <p className="text-small text-soot-2">Nothing: there is no record to read.</p>
        ) : (
          <div className="border-t border-soot-2">
            <FindingList page={data.page} units={units} />
          </div>
        )}
      </div>
      {data.earlierDecisions.length > 0 && (
        <Disclosure summary={`Decided before: ${String(data.earlierDecisions.length)}`}>
          <ul className="border-t border-line">
            {data.earlierDecisions.map((decision) => (
              <li key={decision.at} className="border-b border-line py-2">
                <p>
                  <strong className="font-[650]">{actWords(decision.act)}</strong> by{' '}
                  {decision.by?.name ?? 'a former member'}, {momentWords(decision.at)}
                </p>
                {decision.reason && <p className="text-soot-2">“{decision.reason}”</p>}
              </li>
            ))}
          </ul>
        </Disclosure>
      )}
    </section>
  );
}

/** Brings the first place of a passage into sight. */
function showPassage(root: Element | null, passage: string): void {
  if (!root) return;
  const [range] = rangesIn(root, [passage]);
  range?.startContainer.parentElement?.scrollIntoView({ block: 'center' });
}
