import type { ReactElement } from 'react';
import { ExampleList } from './ExampleList.tsx';
import { titleOf, type Example } from './examples.ts';
import { Refusal } from './Refusal.tsx';
import { StageView } from './StageView.tsx';
import { useFragment } from './useFragment.ts';

/** The window: the example that the address names, the first one where it names none. */
export function Page({ examples }: { readonly examples: readonly Example[] }): ReactElement {
  const fragment = useFragment();
  const chosen = examples.find(({ name }) => name === fragment) ?? examples[0];
  if (chosen === undefined) return <p>There are no examples in this build.</p>;

  const list = <ExampleList examples={examples} chosen={chosen} />;
  const { opened } = chosen;
  return (
    <div className="page">
      <title>{`${titleOf(chosen)}: Restpoint`}</title>
      {opened.ok ? (
        // A new stage starts in its base state.
        <StageView key={chosen.name} stage={opened.value} list={list} />
      ) : (
        <Refusal title={titleOf(chosen)} faults={opened.faults} list={list} />
      )}
    </div>
  );
}
