import { type SheetIdentity } from '../../cutting/files/identity.ts';
import { stationText } from '../../cutting/findings.ts';
import { type CorePlan } from '../../cutting/planner.ts';
import { fixed } from '../../formats/text.ts';
import { type Table, tableColumn } from '../blocks.ts';
import { plainText, timeText } from '../words.ts';

/** Everything that has to be set before the cut, and what the cut is expected to be. */
export function settingsTable(plan: CorePlan, identity: SheetIdentity): Table {
  return {
    kind: 'table',
    title: 'Settings',
    byHand: false,
    columns: [tableColumn('Setting', 0.4), tableColumn('Value', 0.6)],
    rows: [
      ...panelRows(plan),
      ...foamRows(plan, identity),
      ...machineRows(plan, identity),
      ...cutRows(plan),
      ...ribRows(plan, identity),
    ],
  };
}

type Rows = readonly (readonly [string, string])[];

function panelRows({ plan, core }: CorePlan): Rows {
  const { panel, allowances, kerfMm, stock } = plan;
  const stocks = [
    ['Leading-edge stock to', stock.leadingEdgeStation],
    ['Trailing-edge stock from', stock.trailingEdgeStation],
  ] as const;
  return [
    ['Chord, root and tip', `${plainText(panel.root.chordMm)} and ${plainText(panel.tip.chordMm)} mm`],
    ['Span, sweep', `${plainText(panel.spanMm)} mm, ${plainText(panel.sweepMm)} mm`],
    [
      'Washout, vertical offset',
      `${plainText(panel.washoutDeg)}° about ${stationText(panel.washoutStation)}, ${plainText(panel.verticalOffsetMm)} mm`,
    ],
    ['Skin, upper and lower', `${plainText(allowances.upperMm)} and ${plainText(allowances.lowerMm)} mm`],
    ...(plan.block
      ? [['Kerf, root and tip', `${plainText(kerfMm.root)} and ${plainText(kerfMm.tip)} mm`] as const]
      : []),
    [
      'Tolerance, points in step',
      `${plainText(plan.cut.toleranceMm)} mm, ${core.panel.chain.station.length} at each end`,
    ],
    ...stocks.flatMap(([label, station]) =>
      station === null ? [] : [[label, `${stationText(station)} of the chord`] as const],
    ),
    ...core.skinsMeet.map(
      ({ end, station, thicknessMm }) =>
        [`Skins meet, ${end}`, `${stationText(station)}, ${fixed(thicknessMm, 2)} mm thick`] as const,
    ),
  ];
}

function foamRows({ plan, fit, foam }: CorePlan, identity: SheetIdentity): Rows {
  const { block, material } = plan;
  const first = fit?.places[0];
  return [
    ...(material === null
      ? []
      : [
          [
            'Material',
            `${identity.materialName ?? material.name}, ${plainText(material.densityKgM3)} kg/m³`,
          ] as const,
        ]),
    ...(block === null
      ? []
      : [
          [
            'Block, along chord, span, high',
            `${plainText(block.lengthMm)} × ${plainText(block.spanMm)} × ${plainText(block.heightMm)} mm`,
          ] as const,
        ]),
    ...(fit && first
      ? [
          [
            'Root leading edge in the block',
            `${fixed(first.xMm, 2)} from the front, ${fixed(first.yMm, 2)} mm up`,
          ] as const,
          ['Tilt of the core', `${plainText(first.tiltDeg)}°`] as const,
          ['Cores in the block', String(fit.places.length)] as const,
          [
            'Least foam around the cut',
            `root ${fixed(fit.marginMm.root, 1)}, tip ${fixed(fit.marginMm.tip, 1)} mm`,
          ] as const,
        ]
      : []),
    ...(foam
      ? [
          [
            'Core, estimate',
            `${fixed(foam.coreVolumeMm3 / 1000, 1)} cm³, ${fixed(foam.coreMassG, 1)} g`,
          ] as const,
          [
            'Block, estimate',
            `${fixed(foam.blockVolumeMm3 / 1000, 1)} cm³, ${fixed(foam.blockMassG, 1)} g`,
          ] as const,
        ]
      : []),
  ];
}

function machineRows({ plan }: CorePlan, identity: SheetIdentity): Rows {
  const { machine, block } = plan;
  if (!machine) return block ? [['Machine', 'none: cut by hand along the templates']] : [];
  const toward = machine.trailingEdge === 'origin' ? 'towards the origin' : 'away from the origin';
  return [
    ['Machine', identity.machineName ?? machine.name],
    ['Tower distance', `${plainText(machine.towerDistanceMm)} mm`],
    ['Block from the left tower', `${plainText(machine.blockFromLeftMm)} mm`],
    ['Block from the origin', `X ${plainText(machine.blockXMm)}, Y ${plainText(machine.blockYMm)} mm`],
    ['Root face, trailing edge', `${machine.rootFace}, ${toward}`],
  ];
}

function cutRows({ plan, cut }: CorePlan): Rows {
  const { material, machine } = plan;
  if (!material || !machine) return [];
  const order = plan.cut.order === 'round' ? 'all the way round' : 'two passes, through the front';
  const rows: Rows = [
    [
      'Feed, limit of the material',
      `${plainText(material.feedMmMin)}, ${plainText(material.maxFeedMmMin)} mm/min`,
    ],
    ['Order of the cut', order],
    ['Warm-up, clearance', `${plainText(plan.cut.warmUpS)} s, ${plainText(plan.cut.clearanceMm)} mm`],
  ];
  if (!cut) return rows;
  const { melt, simulation } = cut;
  return [
    ...rows,
    ['Slower end, melts more', `${melt.slowerEnd}, ratio ${fixed(melt.ratio, 2)}`],
    ['Largest ratio', `${fixed(melt.largestRatio, 2)} at ${stationText(melt.largestAtStation)}`],
    ['Program runs, estimate', timeText(simulation.totalSeconds)],
    ['Simulated cut off the plan', `${fixed(simulation.largestDeviationMm, 3)} mm at most`],
  ];
}

function ribRows({ plan, ribs }: CorePlan, identity: SheetIdentity): Rows {
  if (!plan.ribs || !ribs) return [];
  const { sheet, materialThicknessMm, fitAllowanceMm } = plan.ribs;
  const name = identity.ribMaterialName === null ? '' : `${identity.ribMaterialName}, `;
  return [
    ['Rib material', `${name}${plainText(materialThicknessMm)} mm thick`],
    ['Fit allowance', `${plainText(fitAllowanceMm)} mm`],
    [
      'Sheets of rib material',
      `${ribs.layout.sheets} of ${plainText(sheet.widthMm)} × ${plainText(sheet.heightMm)} mm`,
    ],
    ['Yield', `${Math.round(ribs.layout.yield * 100)} %`],
  ];
}
