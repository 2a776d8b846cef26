/** Drawn on a 16 px grid with straight strokes, as with a ruling pen. No circles: that is the mark's. */
const DRAWINGS = {
  'must-mend': 'M8 4.4v4.4M8 10.3v1.5',
  'look-again': 'M8 1l7 7-7 7-7-7zM6.3 6.6l.6-1.2h2.2l.6 1.3L8 8.2v.9M8 10.5v1.2',
  info: 'M2 2h12v12H2zM8 7v4.5M8 4.3v1.4',
  done: 'M2 2h12v12H2zM4.8 8.3l2.3 2.4 4.2-5.2',
  close: 'M3.5 3.5l9 9M12.5 3.5l-9 9',
  add: 'M8 2.5v11M2.5 8h11',
  less: 'M2.5 8h11',
  copy: 'M2.5 5.5h8v8h-8zM5.5 2.5h8v8',
  up: 'M8 13.5v-11M3.5 7L8 2.5 12.5 7',
  down: 'M8 2.5v11M3.5 9L8 13.5 12.5 9',
  back: 'M13.5 8h-11M7 3.5L2.5 8 7 12.5',
  on: 'M2.5 8h11M9 3.5L13.5 8 9 12.5',
  remove: 'M2.5 4.5h11M6 4.5v-2h4v2M4 4.5l.7 9h6.6l.7-9M6.7 7v4M9.3 7v4',
  search: 'M2.5 2.5h7v7h-7zM9.5 9.5l4 4',
  retry: 'M13 8.5V13H3V4.5h8.5M9 2l2.7 2.5L9 7',
  day: 'M5 5h6v6H5zM8 .8v2M8 13.2v2M.8 8h2M13.2 8h2M2.9 2.9l1.3 1.3M11.8 11.8l1.3 1.3M2.9 13.1l1.3-1.3M11.8 4.2l1.3-1.3',
  dusk: 'M1 11.5h14M4 8.5V6h8v2.5M3 14.2h10M8 1v2.5',
  system: 'M1.5 2.5h13v8.5h-13zM5 14h6M8 11v3',
} as const;
export type IconName = keyof typeof DRAWINGS;

const SOLID: readonly IconName[] = ['must-mend'];

interface Props {
  readonly name: IconName;
  readonly className?: string;
}

/** Always beside words or inside a named control, so it is hidden from screen readers. */
export function Icon({ name, className = 'size-4' }: Props) {
  const solid = SOLID.includes(name);
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 16 16"
      className={`inline-block shrink-0 ${className}`}
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      strokeLinejoin="miter"
    >
      {solid && <path d="M8 1l7 7-7 7-7-7z" fill="currentColor" />}
      <path d={DRAWINGS[name]} className={solid ? 'stroke-ash' : undefined} />
    </svg>
  );
}
