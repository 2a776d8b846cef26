import { useEffect, useState } from 'react';

interface Props {
  readonly text: string;
  /** Quiet time before it is spoken: findings change with every key, and are told once. */
  readonly quietMs?: number;
}

/** Speaks its latest text politely, after a pause, and only when it has changed. */
export function LiveRegion({ text, quietMs = 1200 }: Props) {
  const [spoken, setSpoken] = useState('');
  useEffect(() => {
    const timer = setTimeout(() => setSpoken(text), quietMs);
    return () => clearTimeout(timer);
  }, [text, quietMs]);
  return (
    <span role="status" aria-live="polite" className="sr-only">
      {spoken}
    </span>
  );
}
