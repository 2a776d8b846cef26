/** The page an address asks for; the first for anything that is none. */
export function pageIn(params: URLSearchParams): number {
  const page = Number(params.get('page') ?? 1);
  return Number.isInteger(page) && page >= 1 && page <= 10_000 ? page : 1;
}
