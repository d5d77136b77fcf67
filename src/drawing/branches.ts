/**
 * Branches as they are drawn: a run of lines and of parts passed straight through, from one junction to the next.
 * One figure of current is enough for each.
 */
import { otherEnd } from './lineCurrents.ts';
import type { ScenePart } from './scene.ts';
import type { Piece } from './wireGraph.ts';

/** A stretch of line by its piece and its number there. */
export interface Run {
  readonly piece: number;
  readonly stretch: number;
}

export interface Branch {
  readonly runs: readonly Run[];
  /** Parts passed through, and those at whose pins the branch ends. */
  readonly through: readonly ScenePart[];
  readonly endsAt: readonly { readonly part: ScenePart; readonly pin: string }[];
}

/** The pin at which what enters at `pin` leaves again, for the parts that have such a pair. */
const oppositePin = (part: ScenePart, pin: string): string | undefined => {
  if (part.pins.has('drain')) return pin === 'drain' ? 'source' : pin === 'source' ? 'drain' : undefined;
  const names = [...part.pins.keys()];
  return names.length === 2 ? names.find((name) => name !== pin) : undefined;
};

interface Step extends Run {
  /** The end of the stretch that has been reached. */
  readonly vertex: number;
}

export const branchesOf = (wiring: readonly Piece[]): readonly Branch[] => {
  const seen = new Set<string>();
  const vertexOfPin = new Map<string, { readonly piece: number; readonly vertex: number }>();
  for (const [piece, { vertices }] of wiring.entries()) {
    for (const [vertex, { pins }] of vertices.entries()) {
      for (const { part, pin } of pins) vertexOfPin.set(`${part.id}.${pin}`, { piece, vertex });
    }
  }

  return wiring.flatMap(({ stretches }, piece) =>
    stretches.flatMap(({ from, to }, stretch): Branch[] => {
      if (!isNew({ piece, stretch })) return [];
      const runs: Run[] = [{ piece, stretch }];
      const through = new Set<ScenePart>();
      const endsAt: Branch['endsAt'][number][] = [];
      for (const vertex of [from, to]) {
        for (let step: Step | undefined = { piece, stretch, vertex }; step !== undefined;) {
          step = onward(step, runs, through, endsAt);
        }
      }
      return [{ runs, through: [...through], endsAt }];
    }),
  );

  function isNew({ piece, stretch }: Run): boolean {
    const key = `${piece}/${stretch}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  }

  /** The next stretch of the branch, for as long as there is exactly one way on. */
  function onward(
    step: Step,
    runs: Run[],
    through: Set<ScenePart>,
    endsAt: Branch['endsAt'][number][],
  ): Step | undefined {
    const vertex = wiring[step.piece]?.vertices[step.vertex];
    if (vertex === undefined || vertex.stretches.length + vertex.pins.length !== 2) return undefined;
    const straight = vertex.stretches.find((other) => other !== step.stretch);
    if (straight !== undefined) return enter(step.piece, straight, step.vertex, runs);
    const [end] = vertex.pins;
    if (end === undefined) return undefined;
    const opposite = oppositePin(end.part, end.pin);
    const far = opposite === undefined ? undefined : vertexOfPin.get(`${end.part.id}.${opposite}`);
    if (opposite === undefined) endsAt.push(end);
    else through.add(end.part);
    if (far === undefined) return undefined;
    const beyond = wiring[far.piece]?.vertices[far.vertex];
    const [only] = beyond?.stretches ?? [];
    if (beyond === undefined || only === undefined) return undefined;
    if (beyond.stretches.length + beyond.pins.length !== 2) return undefined;
    return enter(far.piece, only, far.vertex, runs);
  }

  function enter(piece: number, stretch: number, vertex: number, runs: Run[]): Step | undefined {
    const inside = wiring[piece];
    if (inside === undefined || !isNew({ piece, stretch })) return undefined;
    runs.push({ piece, stretch });
    return { piece, stretch, vertex: otherEnd(inside, stretch, vertex) };
  }
};
