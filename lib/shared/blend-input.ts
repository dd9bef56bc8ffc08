import { z } from 'zod';
import { DECIMAL_TEXT } from './decimal';

/*
 * What a person asks of a blend. The form, the address of the screen, the API and the saved row all hold this one
 * shape; everything beside the target has its usual value. Figures that depend on the target are relative to it.
 */

const id = z.string().min(1).max(40);
const share = z.number().min(0, 'A share lies between 0 and 1.').max(1, 'A share lies between 0 and 1.');
const amount = z.string().regex(DECIMAL_TEXT, 'Write a plain number, such as 120 or 12.50.');

const targetInput = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('material'), materialId: id }),
  z.strictObject({
    kind: z.literal('drawn'),
    name: z.string().trim().min(1).max(120).default('Drawn profile'),
    /** Facet id to intensity; a facet not named is 0. */
    intensities: z.record(
      id,
      z.number().min(0, 'An intensity lies between 0 and 10.').max(10, 'An intensity lies between 0 and 10.'),
    ),
  }),
]);

/** Packs that the materials are priced at, in grams. */
export const PACK_SIZES = ['10', '25', '100', '1000', '5000'] as const;

const ceilingInput = z.strictObject({
  /** At equal strength: what it costs to smell as strong as 1 kg of the target (of a drawn one: 1,000 units of impact). */
  basis: z.enum(['equal strength', 'per kg']),
  amount: amount.refine((text) => Number(text) > 0, 'The price ceiling must be above 0.'),
});

const productInput = z.strictObject({
  category: z.string().min(1).max(8),
  concentratePct: amount.refine(
    (text) => Number(text) > 0 && Number(text) <= 100,
    'The concentrate in the product must be above 0 and at most 100 % by mass.',
  ),
});

const phaseWeight = z.number().min(0).max(10);

export const blendRequest = z.strictObject({
  target: targetInput,
  /** Facet id to weight; a facet not named weighs 1. */
  importance: z.record(id, z.number().min(0).max(10)).default({}),
  packGrams: z.enum(PACK_SIZES).default('100'),
  ceiling: ceilingInput.nullable().default(null),
  /** At least so strong, as a part of the target's strength (of a drawn one: of strength 1). */
  minStrength: z.number().min(0).max(10).nullable().default(0.5),
  minNatural: share.nullable().default(null),
  product: productInput.nullable().default(null),
  /** Leaves out what is not known to contain only what it says. */
  leaveOutIncomplete: z.boolean().default(false),
  excluded: z.array(id).max(500).default([]),
  required: z.array(id).max(50).default([]),
  kept: z
    .array(z.strictObject({ materialId: id, share }))
    .max(50)
    .default([]),
  /** Another largest share than the material's own. */
  maxShares: z
    .array(z.strictObject({ materialId: id, share }))
    .max(200)
    .default([]),
  /** Taken in although they are left out by default: the target itself, and what has no smell. */
  added: z.array(id).max(50).default([]),
  maxMaterials: z.int().min(1).max(60).nullable().default(null),
  minDose: share.nullable().default(null),
  /** How much the opening, the heart and the dry phase count; null looks at the whole without time. */
  phases: z
    .strictObject({ opening: phaseWeight, heart: phaseWeight, dry: phaseWeight })
    .refine(({ opening, heart, dry }) => opening + heart + dry > 0, 'At least one phase must count.')
    .nullable()
    .default(null),
});
export type BlendRequest = z.output<typeof blendRequest>;
export type BlendTarget = BlendRequest['target'];

export const saveBlendInput = z.strictObject({
  name: z.string().trim().min(1, 'Give the blend a name.').max(160, 'A name has at most 160 characters.'),
  note: z.string().trim().max(2000, 'A note has at most 2,000 characters.').default(''),
  request: blendRequest,
});
export type SaveBlendInput = z.output<typeof saveBlendInput>;

/** A request that asks for nothing but the target, with the usual rules. */
export function requestFor(target: z.input<typeof targetInput>): BlendRequest {
  return blendRequest.parse({ target });
}

/** A request that cannot be put to the engine: a sentence for each field at fault. */
export class RequestFault extends Error {
  override readonly name = 'RequestFault';
  constructor(readonly fields: Record<string, string>) {
    super(Object.values(fields).join(' '));
  }
}
