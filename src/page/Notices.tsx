import type { ReactElement } from 'react';
import { signReach, signShapes, type SignKind } from '../drawing/shapes/signs.ts';
import type { Notice } from '../readings/readings.ts';
import { SmallPicture } from './SmallPicture.tsx';

interface NoticesProps {
  readonly kind: SignKind;
  readonly notices: readonly Notice[];
}

const bounds = { left: -signReach, top: -signReach, right: signReach, bottom: signReach };

/** Snags or cautions, each with its sign on the plate and the parts it names. Nothing where there are none. */
export function Notices({ kind, notices }: NoticesProps): ReactElement | null {
  if (notices.length === 0) return null;
  return (
    <section>
      <h2>
        {`${kind}s`} <span className="count">{notices.length}</span>
      </h2>
      <ul className="notices">
        {notices.map((notice, index) => (
          <li key={`${notice.code} ${notice.parts.join(' ')}`}>
            <SmallPicture primitives={signShapes(kind, index + 1, undefined, [0, 0])} bounds={bounds} />
            <p>
              <strong>{notice.parts.join(', ')}</strong>
              {notice.message}
            </p>
          </li>
        ))}
      </ul>
    </section>
  );
}
