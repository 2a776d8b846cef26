import { useEffect, useRef, useState } from 'react';
import { findingText } from '#shared/firing/findings.ts';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import { useWriteForm } from './form-context.ts';

const PAUSE_MILLISECONDS = 1500;

/**
 * Tells politely, after a pause in the typing, which findings and checks are new: all that came in
 * the meantime in one breath, and nothing of what stood there when the page was opened.
 */
export function SpokenFindings() {
  const { reading, checks, units, fields } = useWriteForm();
  const [spoken, setSpoken] = useState('');
  const told = useRef<ReadonlySet<string> | null>(null);
  useEffect(() => {
    const texts = [
      ...reading.findings.map((finding) => findingText(finding, units)),
      // What is merely still blank is told by the list at the end, not while somebody types.
      ...checks.filter(({ code }) => !code.endsWith('-missing')).map(({ text }) => text),
    ];
    if (told.current === null) {
      told.current = new Set(texts);
      return;
    }
    const timer = setTimeout(() => {
      const fresh = texts.filter((text) => told.current?.has(text) !== true);
      told.current = new Set(texts);
      if (fresh.length > 0) setSpoken(fresh.join(' '));
    }, PAUSE_MILLISECONDS);
    return () => clearTimeout(timer);
  }, [reading, checks, units, fields]);
  return <LiveRegion text={spoken} quietMs={100} />;
}
