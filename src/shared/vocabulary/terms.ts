/** A closed list: the id stored and sent, and the words a person reads. */
export type Terms<Id extends string> = Readonly<Record<Id, string>>;

/** The ids of a closed list, in its order, in the non-empty form `z.enum` wants. */
export function idsOf<Id extends string>(terms: Terms<Id>): [Id, ...Id[]] {
  return Object.keys(terms) as [Id, ...Id[]];
}
