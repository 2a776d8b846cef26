import { usePageTitle } from '../ui/usePageTitle.ts';
import { CAUTIONS } from '#shared/cautions.ts';

/** What to know before firing; the same words stand beside every page that tells how to fire. */
export function CautionsPage() {
  usePageTitle('Cautions');
  return (
    <article className="max-w-measure space-y-8">
      <h1 className="text-title">Cautions</h1>
      <p className="text-lead text-soot-2">
        Short facts, no training. They replace neither the burner maker’s instructions, nor local
        rules, nor a competent person.
      </p>
      {CAUTIONS.map((group) => (
        <section key={group.title} className="space-y-3 border-t border-soot pt-4">
          <h2 className="text-section">{group.title}</h2>
          <ul className="space-y-2">
            {group.lines.map((line) => (
              <li key={line.text} className="border-b border-line pb-2">
                {line.text}
                <span className="block text-note text-soot-2">{line.source}</span>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </article>
  );
}
