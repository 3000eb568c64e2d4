import { memo } from 'react';
import { LINE } from '#client/drawing/line-types.ts';
import { type Box } from '#client/drawing/sheet-layout.ts';
import { linePath } from './line-paths.ts';
import { type Place, placeIn, type Zoom } from './plan-layout.ts';
import { type PlacedRib, type RibsModel } from './plan-model.ts';
import { ViewTitle } from './view-title.tsx';

interface RibsViewProps {
  readonly ribs: RibsModel;
  readonly box: Box;
  readonly zoom: Zoom;
}

const ROOM = { left: 12, right: 16, top: 26, bottom: 10 };

/** The first of the sheets that the ribs are cut from, with how many there are. */
export const RibsView = memo(function RibsView({ ribs, box, zoom }: RibsViewProps) {
  const { widthMm, heightMm } = ribs.sheet;
  const place = placeIn(box, { minX: 0, maxX: widthMm, minY: 0, maxY: heightMm }, ROOM, zoom);
  const { sheets } = ribs.layout;
  return (
    <g>
      <ViewTitle
        x={place.corner.x + 10}
        y={place.corner.y + 16}
        text={sheets > 1 ? `Ribs, sheet 1 of ${sheets}` : 'Ribs on their sheet'}
        room={box.width - 20}
      />
      <rect
        x={place.toX(0)}
        y={place.toY(heightMm)}
        width={place.scale * widthMm}
        height={place.scale * heightMm}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.narrow}
      />
      {ribs.placed
        .filter(({ sheet }) => sheet === 0)
        .map((rib) => (
          <RibLines key={rib.number} rib={rib} place={place} />
        ))}
    </g>
  );
});

function RibLines({ rib, place }: { rib: PlacedRib; place: Place }) {
  return (
    <>
      <path
        d={rib.cuts.map((line) => linePath(line, place)).join('')}
        fillRule="evenodd"
        className="fill-foam stroke-ink"
        strokeWidth={LINE.narrow}
      />
      {rib.holes.map(({ x, y, radius }) => (
        <circle
          key={`${x} ${y}`}
          cx={place.toX(x)}
          cy={place.toY(y)}
          r={place.scale * radius}
          className="fill-sheet stroke-ink"
          strokeWidth={LINE.hair}
        />
      ))}
    </>
  );
}
