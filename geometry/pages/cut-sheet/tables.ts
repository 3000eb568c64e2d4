import { boxOf } from '../../cutting/arrays.ts';
import { type Finding, stationText } from '../../cutting/findings.ts';
import { type Feature } from '../../cutting/plan.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { fixed } from '../../formats/text.ts';
import { type Table, type Notes, tableColumn } from '../blocks.ts';
import { CAUTIONS } from '../cautions.ts';
import { plainText } from '../words.ts';

function sentences(title: string, of: readonly (readonly [string, string])[]): Notes {
  return { kind: 'notes', title, sentences: of.map(([before, words]) => ({ before, words })) };
}

/** The cautions for what is done with this plan. */
export function cautionNotes({ plan, ribs }: CorePlan): Notes {
  return sentences('Cautions', [
    ...(plan.block === null ? [] : [['!', CAUTIONS.wire] as const, ['!', CAUTIONS.fumes] as const]),
    ...(plan.machine === null ? [] : [['!', CAUTIONS.machine] as const]),
    ...(ribs === null ? [] : [['!', CAUTIONS.cutter] as const]),
    ['!', CAUTIONS.estimate],
  ]);
}

const WORDS = { error: 'Error', warning: 'Warning', note: 'Note' } as const;

/** Errors and warnings of a plan in whole sentences; null when there are none. */
export function findingNotes(findings: readonly Finding[]): Notes | null {
  const shown = findings.filter(({ severity }) => severity !== 'note');
  if (shown.length === 0) return null;
  const order = [
    ...shown.filter((of) => of.severity === 'error'),
    ...shown.filter((of) => of.severity === 'warning'),
  ];
  return sentences(
    'Findings',
    order.map(({ severity, message }) => [WORDS[severity], message]),
  );
}

const KINDS = { slot: 'Slot', strip: 'Strip', tube: 'Tube', hinge: 'Hinge' } as const;

/** The features, by the numbers they have in the views; null without any. */
export function featureTable({ features, core }: CorePlan): Table | null {
  if (features.length === 0) return null;
  return {
    kind: 'table',
    title: 'Spars, tubes and hinges',
    byHand: false,
    columns: [
      tableColumn('No.', 0.06, 'end'),
      tableColumn('Kind', 0.09),
      tableColumn('Name', 0.16),
      tableColumn('From', 0.09),
      tableColumn('Size', 0.16),
      tableColumn('Root', 0.17),
      tableColumn('Tip', 0.17),
      tableColumn('Web', 0.1, 'end'),
    ],
    rows: features.map(({ index, feature, surface, root, tip }) => {
      const place = (end: 'root' | 'tip') => {
        const box = boxOf((end === 'root' ? root : tip).outline);
        const nose = core.panel[end].toPanel({ x: 0, y: 0 }).x;
        const station = end === 'root' ? feature.rootStation : feature.tipStation;
        return `${stationText(station)}, ${fixed((box.minX + box.maxX) / 2 - nose, 1)}`;
      };
      const web = Math.min(root.webMm, tip.webMm);
      return [
        String(index + 1),
        KINDS[feature.kind],
        feature.name,
        feature.kind === 'strip' ? 'both' : surface,
        sizeText(feature),
        place('root'),
        place('tip'),
        Number.isFinite(web) ? fixed(web, 1) : '–',
      ];
    }),
  };
}

function sizeText(feature: Feature): string {
  switch (feature.kind) {
    case 'slot': {
      const { widthMm, rootDepthMm, tipDepthMm } = feature;
      const depth =
        rootDepthMm === tipDepthMm
          ? plainText(rootDepthMm)
          : `${plainText(rootDepthMm)}/${plainText(tipDepthMm)}`;
      return `${plainText(widthMm)} × ${depth}`;
    }
    case 'strip':
      return `${plainText(feature.widthMm)} wide`;
    case 'tube':
      return `Ø ${plainText(feature.diameterMm)}`;
    case 'hinge':
      return `${plainText(feature.bevelDeg)}°, web ${plainText(feature.webMm)}`;
  }
}

/** The ribs with their places; null without any. */
export function ribTable({ ribs }: CorePlan): Table | null {
  if (!ribs || ribs.ribs.length === 0) return null;
  return {
    kind: 'table',
    title: 'Ribs',
    byHand: false,
    columns: [
      tableColumn('Rib', 0.09, 'end'),
      tableColumn('Station', 0.15, 'end'),
      tableColumn('Long', 0.13, 'end'),
      tableColumn('High', 0.12, 'end'),
      tableColumn('Pieces', 0.12, 'end'),
      tableColumn('Tubes', 0.11, 'end'),
      tableColumn('Holes', 0.11, 'end'),
      tableColumn('Sheet', 0.17, 'end'),
    ],
    rows: ribs.ribs.map(({ number, spanMm, outlines, tubes, holes }) => {
      const box = boxOf(...outlines);
      const place = ribs.layout.places.find((of) => of.number === number);
      return [
        String(number),
        fixed(spanMm, 1),
        fixed(box.maxX - box.minX, 1),
        fixed(box.maxY - box.minY, 1),
        String(outlines.length),
        String(tubes.length),
        String(holes.length),
        place ? `${place.sheet + 1}${place.turned ? ', turned' : ''}` : 'too large',
      ];
    }),
  };
}

/** What the caliper must show, with blanks to fill in by hand. */
export function inspectionTable({ plan, core, inspection }: CorePlan): Table {
  const bare = plan.block === null ? 'ribs without sheeting' : 'the bare core';
  const measured = plan.inspection.measured === 'core' ? bare : 'the part with its skins';
  return {
    kind: 'table',
    title: `Inspection, thickness of ${measured}, mm`,
    byHand: true,
    columns: [
      tableColumn('End', 0.09),
      tableColumn('Station', 0.12, 'end'),
      tableColumn('From nose', 0.13, 'end'),
      tableColumn('Nominal', 0.13, 'end'),
      tableColumn('At least', 0.13, 'end'),
      tableColumn('At most', 0.13, 'end'),
      tableColumn('Measured', 0.15),
      tableColumn('Passed', 0.12),
    ],
    rows: inspection.map(({ end, station, nominalMm, toleranceMm }) => [
      end,
      stationText(station),
      fixed(station * core.panel[end].chordMm, 1),
      fixed(nominalMm, 2),
      fixed(nominalMm - toleranceMm, 2),
      fixed(nominalMm + toleranceMm, 2),
      '',
      '',
    ]),
  };
}

/** Who cut and measured, to be filled in by hand. */
export const SIGNATURES: Table = {
  kind: 'table',
  title: 'Cut and measured',
  byHand: true,
  columns: [
    tableColumn('Work', 0.2),
    tableColumn('Name', 0.4),
    tableColumn('Date', 0.2),
    tableColumn('Remark', 0.2),
  ],
  rows: [
    ['Cut', '', '', ''],
    ['Measured', '', '', ''],
  ],
};
