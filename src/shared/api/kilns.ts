import { z } from 'zod';
import { kilnFieldsSchema } from '../note/kiln-fields.ts';
import { noteRowSchema } from './note-rows.ts';
import { pictureSchema } from './pictures.ts';

export const kilnBodySchema = z.strictObject({ fields: kilnFieldsSchema });
/** The picture is one already uploaded for this kiln, or none. */
export const kilnLoansBodySchema = z.strictObject({
  /** Names of members, as they are shown. */
  members: z.array(z.string().min(1).max(60)).max(50),
});

const personSchema = z.object({ id: z.number(), name: z.string() });

export const kilnAbilitiesSchema = z.object({
  edit: z.boolean(),
  lend: z.boolean(),
  remove: z.boolean(),
  fire: z.boolean(),
});

/** A kiln as the reader may see it, in its present version. */
export const kilnSchema = z.object({
  id: z.number(),
  version: z.number(),
  keeper: personSchema.nullable(),
  fields: kilnFieldsSchema,
  volumeLitres: z.number().nullable(),
  picture: pictureSchema.nullable(),
  removed: z.boolean(),
  /** Only told to the keeper and those it is lent to. */
  lentTo: z.array(personSchema),
  abilities: kilnAbilitiesSchema,
});
export type Kiln = z.infer<typeof kilnSchema>;
export const kilnListSchema = z.object({ kilns: z.array(kilnSchema) });

/** The kiln's page: its published firings in order of firing, oldest first. */
export const kilnPageSchema = kilnSchema.extend({
  versions: z.array(
    z.object({ version: z.number(), madeOn: z.iso.date(), changed: z.array(z.string()) }),
  ),
  firings: z.array(noteRowSchema),
});
export type KilnPage = z.infer<typeof kilnPageSchema>;
