import type { Offer } from '#shared/note/checks/check.ts';
import { noteFieldsSchema, type NoteFields } from '#shared/note/note-fields.ts';

function put(into: unknown, parts: readonly string[], value: unknown): unknown {
  const [part, ...rest] = parts;
  if (part === undefined) return value;
  if (Array.isArray(into)) {
    const index = Number(part);
    return into.map((item: unknown, at) => (at === index ? put(item, rest, value) : item));
  }
  if (typeof into !== 'object' || into === null || !Object.hasOwn(into, part)) return into;
  const members = into as Readonly<Record<string, unknown>>;
  return { ...members, [part]: put(members[part], rest, value) };
}

/**
 * The fields with the correction a check offers. An offer that names no field, or whose value the
 * field cannot hold, leaves everything as it is.
 */
export function takeOffer(fields: NoteFields, offer: Pick<Offer, 'pointer' | 'value'>): NoteFields {
  const next = noteFieldsSchema.safeParse(
    put(fields, offer.pointer.split('/').slice(1), offer.value),
  );
  return next.success ? next.data : fields;
}

/** The fields with an answer to a check; a blank one takes the answer away. */
export function answerCheck(
  fields: NoteFields,
  check: { readonly code: string; readonly pointer: string },
  answer: string,
): NoteFields {
  const { code, pointer } = check;
  const others = fields.checkAnswers.filter(
    (given) => given.code !== code || given.pointer !== pointer,
  );
  return {
    ...fields,
    checkAnswers: answer === '' ? others : [...others, { code, pointer, answer }],
  };
}
