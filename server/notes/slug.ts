const LONGEST = 80;

/** A title as it stands in an address: lower-case ASCII words with hyphens, or `note`. */
export function slugOf(title: string): string {
  const slug = title
    .normalize('NFKD')
    .replace(/[^\x20-\x7e]/g, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, LONGEST)
    .replace(/^-|-$/g, '');
  return slug || 'note';
}
