import { formatPercent } from '#client/app/units.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { describeShape } from '#geometry/shapes/shape.ts';
import { type StartingShape } from './new-section-form.ts';

/** The shape in the making, in true proportion; its place stays when there is none. */
export function ShapePreview({ starting }: { starting: StartingShape }) {
  return (
    <figure className="flex flex-col items-center gap-2 rounded border border-rule bg-sheet px-2 py-4">
      <div className="flex h-26 w-full items-center justify-center">
        {starting.shape !== null && (
          <Thumbnail shape={starting.shape} width={420} height={104} className="h-auto max-w-full" />
        )}
      </div>
      <figcaption className="min-h-5 text-center text-xs text-graphite" aria-live="polite">
        {starting.shape === null ? starting.message : describeShape(starting.shape)}
        {starting.shape !== null && starting.residual !== null && (
          <>, within {formatPercent(starting.residual, 4)} of chord of the 4-digit section</>
        )}
      </figcaption>
    </figure>
  );
}
