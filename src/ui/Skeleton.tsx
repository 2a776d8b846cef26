interface Props {
  /** What is coming, for those who do not see its shape: "Notes are being fetched". */
  readonly words: string;
  readonly shape: 'rows' | 'sheet' | 'text' | 'strip';
  readonly count?: number;
}

const WIDTHS = ['w-3/5', 'w-4/5', 'w-2/5', 'w-11/12', 'w-1/2', 'w-2/3'];

/** The shape of what comes, in hairlines. */
export function Skeleton({ words, shape, count = 4 }: Props) {
  return (
    <div role="status" className="w-full">
      <span className="sr-only">{words}</span>
      <div aria-hidden="true" className="shape-coming">
        {shape === 'strip' && <div className="h-24 border border-line" />}
        {shape !== 'strip' &&
          Array.from({ length: count }, (_, index) => (
            <ShapeLine key={index} shape={shape} width={WIDTHS[index % WIDTHS.length] ?? 'w-1/2'} />
          ))}
      </div>
    </div>
  );
}

function ShapeLine({
  shape,
  width,
}: {
  readonly shape: 'rows' | 'sheet' | 'text';
  readonly width: string;
}) {
  if (shape === 'text') return <div className={`my-3 h-3 bg-line ${width}`} />;
  if (shape === 'sheet') {
    return (
      <div className="grid grid-cols-[2fr_3fr] gap-4 border-b border-line py-3">
        <div className="h-3 w-2/3 bg-line" />
        <div className={`h-3 bg-line ${width}`} />
      </div>
    );
  }
  return (
    <div className="grid items-center gap-x-8 gap-y-3 border-b border-line py-5 sm:grid-cols-[20rem_1fr]">
      <div className={`h-7 border border-line ${width}`} />
      <div className="space-y-2.5">
        <div className={`h-4 bg-line ${width}`} />
        <div className="h-3 w-3/4 bg-line" />
      </div>
    </div>
  );
}
