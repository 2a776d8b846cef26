/** Heights of the crack line, px from the middle, every 1/24 of its length; branches hang from it. */
const CRACK =
  'M0 12L44 9 71 14 128 11 163 15 204 8 259 12 301 10 356 15 402 11 447 13 511 7 553 12 608 10 661 15 702 9 760 13 811 10 859 14 903 9 958 12 1000 11';
const BRANCHES =
  'M71 14L60 24M204 8L216 0M301 10L318 1M402 11L391 23M511 7L523 0M608 10L622 24M702 9L690 0M859 14L871 24';

/** A division of a page drawn as crackle: the crazing of a quenched glaze with soot in it. */
export function CrackleRule() {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 1000 24"
      preserveAspectRatio="none"
      className="ink-drawing block h-4 w-full"
      fill="none"
    >
      <path className="stroke-soot-2" vectorEffect="non-scaling-stroke" d={CRACK} />
      <path className="stroke-line" vectorEffect="non-scaling-stroke" d={BRANCHES} />
    </svg>
  );
}
