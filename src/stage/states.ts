import { resolveValue } from '../values/value-spec.ts';
import type { ResolvedValue } from '../values/value-spec.ts';
import { defaultBase } from './schema/stage.ts';
import type { Conditions, Part, StageDocument } from './schema/stage.ts';

/** The name of the state in which the drawing stands. */
export const baseName = (document: Pick<StageDocument, 'base'>): string => document.base ?? defaultBase;

/** Names of all states, the base state's first. */
export const stateNames = (document: StageDocument): readonly string[] => [
  baseName(document),
  ...Object.keys(document.states),
];

/** `p5.voltage` as its part and key. */
export function splitSetKey(key: string): readonly [part: string, value: string] {
  const dot = key.indexOf('.');
  return dot === -1 ? [key, ''] : [key.slice(0, dot), key.slice(dot + 1)];
}

/**
 * The document as it stands in a state: its values, duties and conditions in place of the base state's. The
 * document itself for the base state; undefined where there is no such state. `states` stays as it is, so that
 * the result is a document like any other and shares with it whatever is the same.
 */
export function inState(document: StageDocument, name: string): StageDocument | undefined {
  if (name === baseName(document)) return document;
  const state = Object.hasOwn(document.states, name) ? document.states[name] : undefined;
  if (state === undefined) return undefined;
  const parts: Record<string, Part> = { ...document.parts };
  const change = (id: string, differs: (part: Part) => Part) => {
    const part = parts[id];
    if (part !== undefined) parts[id] = differs(part);
  };
  for (const [key, value] of Object.entries(state.set ?? {})) {
    const [id, of] = splitSetKey(key);
    change(id, (part) => ({ ...part, values: { ...part.values, [of]: value } }));
  }
  for (const [id, duty] of Object.entries(state.duties ?? {})) change(id, (part) => ({ ...part, duty }));
  return { ...document, parts, conditions: { ...document.conditions, ...state.conditions } };
}

export interface EffectiveConditions {
  /** °C. */
  readonly ambient: ResolvedValue;
  readonly law: 'square' | 'smooth';
  readonly selfHeating: boolean;
}

/** The conditions with what holds where none are stated: 25 °C, the square law, no self-heating. */
export const effectiveConditions = ({ ambient, law, selfHeating }: Conditions): EffectiveConditions => ({
  ambient: resolveValue(ambient ?? 25, 'temperature'),
  law: law ?? 'square',
  selfHeating: selfHeating ?? false,
});
