/** Teeth of a torn end, px from the edge, top to bottom. Uneven as a tear is. */
const TEETH = [0, 7, 2.5, 9, 4, 8, 1, 6, 0];

/** The outline of a strip from x = `from` to `to`; a torn one ends in uneven teeth. */
export function stripOutline(from: number, to: number, top: number, height: number, torn: boolean) {
  const bottom = top + height;
  if (!torn) return `M${from} ${top}H${to}V${bottom}H${from}Z`;
  const teeth = TEETH.map((tooth, index) => {
    const y = top + (height * index) / (TEETH.length - 1);
    return `L${to - tooth} ${y.toFixed(2)}`;
  });
  return `M${from} ${top}${teeth.join('')}L${from} ${bottom}Z`;
}
