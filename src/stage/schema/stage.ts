/** The stage document, version 1, written once: the reader checks against it and the types come from it. */
import type { Immutable } from 'immer';
import * as z from 'zod';
import { deviceSchema } from '../../parts/devices/device.ts';
import { choice, quantity, shortText, yesOrNo } from '../../values/schema.ts';
import { duty } from './duty.ts';
import { part } from './part.ts';
import { freeText, id, labelKey, name, point } from './pieces.ts';

export const currentVersion = 1;
export const formatName = 'restpoint-stage';
/** The base state's name where none is stated. */
export const defaultBase = 'on';

const conditions = z.strictObject({
  ambient: z.exactOptional(quantity('temperature')),
  law: z.exactOptional(choice('square', 'smooth')),
  /** Devices warm themselves: junction temperatures are solved with the circuit. */
  selfHeating: z.exactOptional(yesOrNo()),
});

const end = z.union([z.tuple([id, name]), z.tuple([id])]);

const wire = z.strictObject({
  /** Each `[part, pin]` or `[joint]`. */
  ends: z.tuple([end, end]),
  /** Corners, without the ends. */
  path: z.exactOptional(z.array(point).max(1000)),
});

const state = z.strictObject({
  /** `p5.voltage` to the value it has in this state; which values there are depends on the part's kind. */
  set: z.exactOptional(z.record(labelKey, z.unknown())),
  duties: z.exactOptional(z.record(id, duty)),
  conditions: z.exactOptional(conditions),
});

const scalar = z.union([z.number(), freeText(1000), z.boolean(), z.null()]);
/** A question's inputs: flat, so that they can be kept before the question is asked and shown as a form. */
const inputs = z.record(labelKey, z.union([scalar, z.array(scalar).max(1000)]));

export const questionNames = [
  'sweep',
  'curves',
  'spread',
  'aim',
  'window',
  'signal',
  'rests',
  'service',
  'faults',
] as const;

const questions = z.strictObject(
  Object.fromEntries(questionNames.map((question) => [question, z.exactOptional(inputs)])) as Record<
    (typeof questionNames)[number],
    z.ZodExactOptional<typeof inputs>
  >,
);

const view = z.strictObject({
  /** Where chips were dragged to: key of the chip to its offset in grid units. */
  chips: z.exactOptional(z.record(labelKey, z.tuple([z.number(), z.number()]))),
  density: z.exactOptional(choice('all', 'key', 'none')),
});

const mark = z.strictObject({
  title: z.exactOptional(shortText()),
  date: z.exactOptional(shortText()),
  state: z.exactOptional(name),
  /** Name of a reading to its figure, SI; null where the drawing did not set it. */
  readings: z.record(labelKey, z.union([z.number(), z.null()])),
});

export const stageSchema = z.strictObject({
  format: z.literal(formatName),
  version: z.literal(currentVersion),
  title: freeText(200),
  author: z.exactOptional(freeText(200)),
  date: z.exactOptional(freeText(60)),
  notes: z.exactOptional(freeText(20_000)),
  /** Name of the state in which the drawing stands. */
  base: z.exactOptional(name),
  conditions,
  devices: z.record(id, deviceSchema),
  parts: z.record(id, part),
  joints: z.record(id, point),
  wires: z.record(id, wire),
  states: z.record(name, state),
  questions,
  view: z.exactOptional(view),
  marks: z.exactOptional(z.record(id, mark)),
  /** Id of a part to the ids of the devices approved for it. */
  alternates: z.exactOptional(z.record(id, z.array(id).min(1))),
});

/** The document: one drawing, its devices, states and questions. Plain data, never changed in place. */
export type StageDocument = Immutable<z.infer<typeof stageSchema>>;

export type Part = StageDocument['parts'][string];
export type Wire = StageDocument['wires'][string];
export type WireEnd = Wire['ends'][number];
export type State = StageDocument['states'][string];
export type Conditions = StageDocument['conditions'];
export type Duty = NonNullable<Part['duty']>;
export type DutyLimits = Exclude<Duty, string>;
export type View = NonNullable<StageDocument['view']>;
export type Mark = NonNullable<StageDocument['marks']>[string];
export type QuestionName = (typeof questionNames)[number];
export type GridPoint = readonly [number, number];
