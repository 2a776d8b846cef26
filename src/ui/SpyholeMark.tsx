interface Props {
  readonly className?: string;
  /** The eye narrows and widens while something is being fetched or done. */
  readonly busy?: boolean;
  /** On coloured ground the eye takes the ink's colour. */
  readonly plain?: boolean;
}

/** A soot ring of four bricks with a verdigris eye. Decoration: its words stand beside it. */
export function SpyholeMark({ className = 'size-7', busy = false, plain = false }: Props) {
  return (
    <svg aria-hidden="true" viewBox="0 0 32 32" className={`inline-block shrink-0 ${className}`}>
      <circle cx="16" cy="16" r="11.5" fill="none" className="stroke-current" strokeWidth="7" />
      <path
        d="M16 0v5.4l1.7 2.5M32 16h-5.3l-2.4-1.6M16 32v-4.9l-1.5-2.8M0 16h4.7l2.9 1.4"
        fill="none"
        className={plain ? 'hidden' : 'stroke-ash'}
        strokeWidth="1.1"
      />
      <circle
        cx="16"
        cy="16"
        r="5.2"
        className={`${plain ? 'fill-current' : 'fill-verdigris'} ${busy ? 'busy-eye' : ''}`}
      />
    </svg>
  );
}
