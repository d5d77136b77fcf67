import { standParts } from '../../stage/routing/shape.ts';
import type { CompiledStage } from '../compile.ts';
import type { Notice } from '../readings.ts';

/** Parts whose symbols lie on one another. */
export const overlapSnags = ({ document, partOf }: CompiledStage): readonly Notice[] => {
  const standing = [...standParts(document).values()];
  const nameOf = (id: string): string => partOf.get(id)?.name ?? id;
  return standing.flatMap((one, index) =>
    standing.slice(index + 1).flatMap((other): readonly Notice[] => {
      const apart =
        one.body.right <= other.body.left ||
        other.body.right <= one.body.left ||
        one.body.bottom <= other.body.top ||
        other.body.bottom <= one.body.top;
      if (apart) return [];
      return [
        {
          code: 'overlap',
          severity: 'note',
          parts: [nameOf(one.id), nameOf(other.id)],
          message: `${nameOf(one.id)} and ${nameOf(other.id)} lie on one another: move one of them`,
        },
      ];
    }),
  );
};
