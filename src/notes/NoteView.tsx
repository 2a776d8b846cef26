import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { CAUTIONS_IN_BRIEF } from '#shared/cautions.ts';
import type { NotePageData } from '#shared/api/notes.ts';
import { inShort } from '#shared/note/in-short.ts';
import { paths } from '#shared/paths.ts';
import { formatChamber } from '#shared/units/volume.ts';
import type { Units } from '#shared/units/units.ts';
import { CAUSES } from '#shared/vocabulary/troubles.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { CautionNote } from '../ui/CautionNote.tsx';
import { FiringSheet } from '../ui/FiringSheet.tsx';
import { GlowStrip } from '../ui/GlowStrip.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { NotePieces } from './NotePieces.tsx';
import { drawnMarks, holdOf } from './drawn-findings.ts';
import { NoteRecord } from './NoteRecord.tsx';
import { NoteRows } from './NoteRows.tsx';
import { NoteStory } from './NoteStory.tsx';
import { SeriesLinks } from './SeriesLinks.tsx';
import { changeWords, dayWords, disputedWords, troubleWords } from './note-words.ts';
import type { RecordOf } from './note-queries.ts';
import { sheetGroups } from './sheet-groups.ts';

interface Props {
  readonly page: NotePageData;
  readonly units: Units;
  readonly recordOf?: RecordOf;
  /** Buttons and notices of the page that shows it. */
  readonly aside?: ReactNode;
  /** What that page adds after all that the note itself says. */
  readonly after?: ReactNode;
  /** What readers ask about it, where it is published. */
  readonly questions?: ReactNode;
}

/** A note whole: the same for readers, the author's preview and the desk. */
export function NoteView({ page, units, recordOf = 'published', aside, after, questions }: Props) {
  const { row, fields, kiln } = page;
  const troubles = troubleWords(row, units);
  const disputed = disputedWords(row);
  return (
    <article className="space-y-12 print:space-y-5">
      <header className="space-y-5 print:space-y-2.5">
        <div className="space-y-2">
          <h1 className="max-w-[26ch] text-title sm:text-face print:max-w-none print:text-title">
            {row.title || 'Untitled'}
          </h1>
          <p className="text-small text-soot-2">
            {page.author ? (
              <Link to={paths.member(page.author.id)} className="link">
                {page.author.name}
              </Link>
            ) : (
              'A former member'
            )}
            {FACT_SEPARATOR}
            <Link to={paths.kiln(kiln.id)} className="link">
              {row.kiln.name}
            </Link>
            {kiln.removed && ' (no longer in use)'}
            {kiln.volumeLitres !== null && `, ${formatChamber(kiln.volumeLitres, units)}`}
            {row.firedOn && `${FACT_SEPARATOR}fired ${dayWords(row.firedOn)}`}
            {fields.when.startClass === 'hot' && ', started hot'}
          </p>
        </div>
        {aside}
        {row.strip && row.strip.length > 1 && (
          <>
            <GlowStrip
              points={row.strip}
              alt={row.stripWords}
              targetCelsius={row.targetCelsius}
              hold={holdOf(page.findings)}
              marks={drawnMarks(page.marks)}
              unit={units.temperature}
            />
            <HeatLegend unit={units.temperature} />
          </>
        )}
        <p className="max-w-measure text-lead">{inShort(page.summary, units).join(' ')}</p>
        {troubles.length > 0 && (
          <p className="text-small">
            <span className="text-soot-2">Troubles: </span>
            <strong className="font-[650]">{troubles.join(FACT_SEPARATOR)}</strong>
            {fields.result.causes.length > 0 && (
              <span className="block text-soot-2">
                Suspected:{' '}
                {fields.result.causes.map((cause) => CAUSES[cause].toLowerCase()).join(', ')}
              </span>
            )}
          </p>
        )}
        {disputed !== null && <p className="text-small text-soot-2">{disputed}</p>}
      </header>
      <section aria-labelledby="sheet" className="space-y-3">
        <h2 id="sheet" className="text-section">
          Firing sheet
        </h2>
        <FiringSheet groups={sheetGroups(page, units)} />
      </section>
      <NoteRecord page={page} units={units} of={recordOf} />
      <NotePieces pieces={fields.pieces} units={units} />
      <Changes page={page} />
      <NoteStory html={page.storyHtml} />
      <Remarks fields={fields} />
      <SeriesLinks
        row={row}
        kiln={{ id: kiln.id, name: row.kiln.name }}
        earlier={page.earlier}
        next={page.next}
        followOn={page.followOn}
        units={units}
      />
      <TriedIt page={page} units={units} />
      {after}
      {questions}
      <CautionNote>
        <p>{CAUTIONS_IN_BRIEF}</p>
        <p>
          This is one member’s account. Published means that a moderator has read it, not that it is
          safe.{' '}
          <Link to={paths.cautions} className="link">
            All cautions
          </Link>
        </p>
      </CautionNote>
    </article>
  );
}

/** What was done differently from the firing before, and what for. */
function Changes({ page }: { readonly page: NotePageData }) {
  const { changes } = page.fields;
  if (changes.length === 0) return null;
  return (
    <section aria-labelledby="changes" className="space-y-3">
      <h2 id="changes" className="text-section">
        Changed since the firing before
      </h2>
      <dl className="max-w-measure border-t border-soot text-small">
        {changes.map(({ change, purpose }) => (
          <div
            key={change}
            className="grid gap-x-6 border-b border-line py-2 sm:grid-cols-[14rem_1fr]"
          >
            <dt className="font-[600] first-letter:uppercase">{changeWords([change])}</dt>
            <dd className="text-soot-2">{purpose || 'no purpose given'}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

function Remarks({ fields }: { readonly fields: NotePageData['fields'] }) {
  const { surprised, nextTime } = fields.result;
  if (!surprised && !nextTime) return null;
  return (
    <section aria-label="What the author takes from it" className="max-w-measure space-y-3">
      {surprised && (
        <div>
          <h3 className="text-small text-soot-2">What surprised</h3>
          <p className="font-story text-story">{surprised}</p>
        </div>
      )}
      {nextTime && (
        <div>
          <h3 className="text-small text-soot-2">What to do next time</h3>
          <p className="font-story text-story">{nextTime}</p>
        </div>
      )}
    </section>
  );
}

/** Whose change this tried, and who tried this one's. */
function TriedIt({ page, units }: { readonly page: NotePageData; readonly units: Units }) {
  if (!page.triedNote && page.triedBy.length === 0) return null;
  return (
    <section aria-labelledby="tried" className="space-y-3">
      <h2 id="tried" className="text-section">
        Tried it
      </h2>
      {page.triedNote && (
        <p>
          This firing tried a change from{' '}
          <Link to={paths.note(page.triedNote.id, page.triedNote.slug)} className="link">
            {page.triedNote.title}
          </Link>
          .
        </p>
      )}
      {page.triedBy.length > 0 && <NoteRows rows={page.triedBy} units={units} />}
    </section>
  );
}
