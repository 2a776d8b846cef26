import { SpyholeMark } from './SpyholeMark.tsx';

/** Something is under way, with the words for it. */
export function BusyMark({ words }: { readonly words: string }) {
  return (
    <span role="status" className="inline-flex items-center gap-2 text-small text-soot-2">
      <SpyholeMark busy className="size-5 text-soot" />
      {words}
    </span>
  );
}
