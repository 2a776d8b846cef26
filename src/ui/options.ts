/** One entry of a menu or a choice. */
export interface Option<Value extends string> {
  readonly value: Value;
  readonly label: string;
}

/** The entries of a closed list (id → words), in its order. */
export function optionsOf<Value extends string>(
  terms: Readonly<Record<Value, string>>,
): readonly Option<Value>[] {
  return (Object.entries(terms) as [Value, string][]).map(([value, label]) => ({ value, label }));
}
