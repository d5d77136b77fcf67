import type { ReactElement } from 'react';
import type { Notice } from '../readings/readings.ts';

/** Snags or cautions, each with the parts it names. Nothing where there are none. */
export function Notices({
  title,
  notices,
}: {
  readonly title: string;
  readonly notices: readonly Notice[];
}): ReactElement | null {
  if (notices.length === 0) return null;
  return (
    <section>
      <h2>
        {title} <span className="count">{notices.length}</span>
      </h2>
      <ul className="notices">
        {notices.map((notice) => (
          <li key={`${notice.code} ${notice.parts.join(' ')}`}>
            <strong>{notice.parts.join(', ')}</strong>
            {notice.message}
          </li>
        ))}
      </ul>
    </section>
  );
}
