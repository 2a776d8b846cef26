interface Props {
  readonly type: 'radio' | 'checkbox';
  readonly name: string;
  readonly label: string;
  readonly checked: boolean;
  readonly onChecked: (checked: boolean) => void;
  readonly disabled?: boolean | undefined;
  readonly invalid?: boolean | undefined;
}

/** One box of a ruled row, crossed as on a paper sheet. A native control lies under it. */
export function ChoiceCell(props: Props) {
  return (
    <label className="relative -ml-px -mt-px inline-flex min-h-10 items-center gap-2 border border-line px-3 py-1 text-small select-none hover:bg-ash-2 has-checked:z-10 has-checked:border-soot-2 has-checked:bg-verdigris-tint has-checked:font-[650] has-checked:text-verdigris-ink has-focus-visible:z-20 has-focus-visible:outline-2 has-focus-visible:outline-offset-1 has-focus-visible:outline-verdigris has-disabled:text-soot-2 touch:min-h-11">
      <input
        type={props.type}
        name={props.name}
        className="peer absolute inset-0 size-full opacity-0"
        checked={props.checked}
        onChange={(event) => props.onChecked(event.currentTarget.checked)}
        disabled={props.disabled}
        aria-invalid={props.invalid}
      />
      <CrossedBox crossed={props.checked} />
      {props.label}
    </label>
  );
}

/** The box itself: empty or crossed. */
export function CrossedBox({ crossed }: { readonly crossed: boolean }) {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 14 14"
      className="size-3.5 shrink-0 overflow-visible"
      fill="none"
      stroke="currentColor"
    >
      <path d="M1 1h12v12H1z" strokeWidth="1" />
      {crossed && <path d="M-.5 0L14 14.5M14.5 -.5L0 14" strokeWidth="2" />}
    </svg>
  );
}
