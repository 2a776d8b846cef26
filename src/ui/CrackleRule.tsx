/** One crack right across, and those that run off it: drawn by hand, stretched to any width. */
const CRACK =
  'M0 17L23 15 61 20 84 13 150 16 171 10 243 14 262 19 318 17 351 9 377 12 449 8 470 15 533 18 561 12 640 15 659 9 688 11 742 6 771 13 838 17 866 12 931 14 948 9 1000 12';
const BRANCHES =
  'M61 20L54 28M84 13L97 4 131 0M171 10L160 0M262 19L281 28M351 9L340 3 348 0M377 12L396 22 451 24 470 15M451 24L458 28M561 12L574 4 612 3 659 9M612 3L618 0M688 11L702 21 693 28M702 21L756 23 771 13M866 12L859 3 873 0M931 14L944 24 990 28';

/** A division of a page drawn as crackle: the crazing of a quenched glaze with soot in it. */
export function CrackleRule() {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 1000 28"
      preserveAspectRatio="none"
      className="ink-drawing block h-7 w-full"
      fill="none"
    >
      <path
        className="stroke-soot"
        strokeWidth="1.25"
        vectorEffect="non-scaling-stroke"
        d={CRACK}
      />
      <path
        className="stroke-soot-2"
        strokeWidth="0.75"
        vectorEffect="non-scaling-stroke"
        d={BRANCHES}
      />
    </svg>
  );
}
