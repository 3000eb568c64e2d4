import { memo } from 'react';
import { LINE } from './line-types.ts';
import { pointsPath } from './section-lines.tsx';
import { curvatureComb } from './distribution.ts';
import { type SectionDrawing } from './section-drawing.ts';
import { type SheetTransform } from './sheet-view.ts';

/** Curvature combs on both surfaces: a bump shows long before the eye sees it in the outline. */
export const CurvatureComb = memo(function CurvatureComb({
  drawing,
  transform,
}: {
  drawing: SectionDrawing;
  transform: SheetTransform;
}) {
  return (
    <g aria-hidden="true" className="fill-none stroke-spruce">
      {(['upper', 'lower'] as const).map((surface) => {
        const teeth = curvatureComb(drawing, surface);
        return (
          <g key={surface}>
            <path
              d={teeth.map(({ root, tip }) => pointsPath([root, tip], transform)).join('')}
              strokeWidth={LINE.hair}
              strokeOpacity={0.55}
            />
            <path
              d={pointsPath(
                teeth.map(({ tip }) => tip),
                transform,
              )}
              strokeWidth={LINE.narrow}
            />
          </g>
        );
      })}
    </g>
  );
});
