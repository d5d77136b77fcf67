import type { ReactElement } from 'react';
import { titleOf, type Example } from './examples.ts';

/** The examples as links, so that one can be kept, sent and gone back to. */
export function ExampleList({
  examples,
  chosen,
}: {
  readonly examples: readonly Example[];
  readonly chosen: Example;
}): ReactElement {
  return (
    <nav aria-labelledby="examples">
      <section>
        <h2 id="examples">examples</h2>
        <ul className="examples">
          {examples.map((example) => (
            <li key={example.name}>
              <a href={`#${example.name}`} aria-current={example === chosen ? 'page' : undefined}>
                {titleOf(example)}
              </a>
            </li>
          ))}
        </ul>
      </section>
    </nav>
  );
}
