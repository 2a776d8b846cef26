import { useEffect, useEffectEvent } from 'react';

interface Options {
  /** Whether this one is for us; the first listener that takes a file keeps it. */
  readonly takes: (file: File) => boolean;
  readonly onFiles: (files: readonly File[]) => void;
  readonly disabled?: boolean;
}

const carriesFiles = (event: DragEvent): boolean =>
  event.dataTransfer?.types.includes('Files') ?? false;

/** Files dropped anywhere on the page. None is ever opened by the browser in place of the page. */
export function useFileDrop({ takes, onFiles, disabled = false }: Options): void {
  const drop = useEffectEvent((event: DragEvent) => {
    if (!carriesFiles(event)) return;
    event.preventDefault();
    if (disabled) return;
    const mine = [...(event.dataTransfer?.files ?? [])].filter(takes);
    if (mine.length > 0) onFiles(mine);
  });
  useEffect(() => {
    const over = (event: DragEvent): void => {
      if (carriesFiles(event)) event.preventDefault();
    };
    const dropped = (event: DragEvent): void => drop(event);
    window.addEventListener('dragover', over);
    window.addEventListener('drop', dropped);
    return () => {
      window.removeEventListener('dragover', over);
      window.removeEventListener('drop', dropped);
    };
  }, []);
}

/** A logger's table by its name or type; everything else dropped is taken for a picture. */
export function looksLikeTable(file: File): boolean {
  return (
    /\.(csv|tsv|txt|dat|log|xlsx?|ods)$/i.test(file.name) ||
    file.type === 'text/csv' ||
    file.type === 'text/plain'
  );
}
