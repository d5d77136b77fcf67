import { readStage } from '../stage/readStage.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import type { Result } from '../values/result.ts';

const files: Readonly<Record<string, string>> = import.meta.glob('../../examples/*.stage.json', {
  query: '?raw',
  import: 'default',
  eager: true,
});

/** A stage that comes with the program. */
export interface Example {
  /** File name without its ending: `pump-switch`; also the address's fragment. */
  readonly name: string;
  readonly opened: Result<StageDocument>;
}

/** What a newcomer sees first. */
const first = 'echo-preamplifier';

/** Opens the examples, in the order of the list. */
export const openExamples = (): Promise<readonly Example[]> =>
  Promise.all(
    Object.entries(files)
      .map(([path, text]) => ({ name: path.replace(/^.*\//, '').replace('.stage.json', ''), text }))
      .sort(
        (one, other) =>
          Number(other.name === first) - Number(one.name === first) || (one.name < other.name ? -1 : 1),
      )
      .map(async ({ name, text }) => ({ name, opened: await readStage(text) })),
  );

export const titleOf = ({ name, opened }: Example): string => (opened.ok ? opened.value.title : name);
