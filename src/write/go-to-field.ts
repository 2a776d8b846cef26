import { sectionOf } from './write-sections.ts';

const FOCUSABLE = 'input:not([type=hidden]), select, textarea, button, [contenteditable=true]';

/** Pointers from the field itself up to its group: `/pieces/2/spanMm`, `/pieces/2`, `/pieces`. */
export function pointersUpwards(pointer: string): string[] {
  const parts = pointer.split('/').slice(1);
  return parts.map((_, index) => `/${parts.slice(0, parts.length - index).join('/')}`);
}

/** Leads to the field at a pointer, unfolding what it is folded into; else to its section. */
export function goToField(pointer: string): void {
  const field = pointersUpwards(pointer)
    .map((each) => document.querySelector<HTMLElement>(`[data-pointer="${CSS.escape(each)}"]`))
    .find((found) => found !== null);
  const section = document.getElementById(`section-${sectionOf(pointer) ?? 'hand-in'}`);
  const target = field ?? section;
  if (!target) return;
  for (let up = target.parentElement; up; up = up.parentElement) {
    if (up instanceof HTMLDetailsElement) up.open = true;
  }
  target.scrollIntoView({ block: 'center' });
  const control = field?.querySelector<HTMLElement>(FOCUSABLE) ?? section;
  control?.focus({ preventScroll: true });
}
