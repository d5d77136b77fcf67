import * as z from 'zod';
import { catalogue } from '../../parts/catalogue.ts';
import type { PartKind } from '../../parts/kind.ts';
import { shortText } from '../../values/schema.ts';
import { duty } from './duty.ts';
import { id, name, point, turn } from './pieces.ts';

/** Every key a part can have; which of them depends on its kind. */
const envelope = z.strictObject({
  kind: z.string(),
  name: z.exactOptional(name),
  /** Of a rail: what is written at it in place of its name, "+12V". */
  label: z.exactOptional(shortText(60)),
  place: z.exactOptional(point),
  turn: z.exactOptional(turn),
  mirror: z.exactOptional(z.boolean()),
  /** Id in `devices`. */
  device: z.exactOptional(id),
  duty: z.exactOptional(duty),
  /** Parts of one lot draw together in the spread. */
  lot: z.exactOptional(name),
  /** Inside the lot: a fraction; on a threshold, volts. */
  mismatch: z.exactOptional(z.number().min(0).max(0.99)),
  values: z.exactOptional(z.record(z.string(), z.unknown())),
});

export type RawPart = z.infer<typeof envelope>;

/** The schema of one kind's parts: the keys that mean something for it, its own values. */
function schemaOfKind(kind: PartKind) {
  const { shape } = envelope;
  const valuesNeeded = !kind.values.safeParse({}).success;
  const canVary =
    kind.deviceTypes.length > 0 || kind.fields.some((field) => field.form === 'quantity' && field.varied);
  return z.strictObject({
    kind: z.literal(kind.kind),
    name: kind.nameNeeded ? name : shape.name,
    ...(kind.joins === 'name' ? { label: shape.label } : {}),
    place: shape.place,
    turn: shape.turn,
    mirror: shape.mirror,
    ...(kind.deviceTypes.length > 0 ? { device: id } : {}),
    ...(kind.takesDuty ? { duty: shape.duty } : {}),
    ...(canVary ? { lot: shape.lot, mismatch: shape.mismatch } : {}),
    values: valuesNeeded ? kind.values : z.exactOptional(kind.values),
  });
}

type KindSchema = ReturnType<typeof schemaOfKind>;

/** Built when first needed, once: the catalogue says which kinds there are. */
export const part = z.lazy(() => {
  const [first, ...rest] = catalogue.map(schemaOfKind);
  if (first === undefined) throw new Error('the catalogue is empty');
  return z.discriminatedUnion('kind', [first, ...rest] satisfies [KindSchema, ...KindSchema[]]);
}) as unknown as z.ZodType<RawPart>;
