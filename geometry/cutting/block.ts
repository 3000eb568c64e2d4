import { type Box, type Polyline, boxOf } from './arrays.ts';
import { type Core } from './core.ts';
import { type PlacedFeature } from './features.ts';
import { type Finding, error, mm, warning } from './findings.ts';
import { ruledVolume } from './panel.ts';
import { type BlockPlan, ENDS, type End, type FoamPlan, type Machine, type Plan } from './plan.ts';

/** One core's place in the block: x from the front, y from the underside, mm; turned about the root's leading edge. */
export interface BlockPlace {
  readonly xMm: number;
  readonly yMm: number;
  readonly tiltDeg: number;
  /** The second core of a pair is mirrored along the span: its tip is where the first one's root is. */
  readonly mirrored: boolean;
}

export interface BlockFit {
  /** One place, or two for a pair that fits. */
  readonly places: readonly BlockPlace[];
  /** The least foam around the kerfs at each end, mm; negative where the cut leaves the block. */
  readonly marginMm: Readonly<Record<End, number>>;
  readonly findings: readonly Finding[];
}

/** Turns and moves a line of the panel's frame into the block's. */
export function toBlock({ xMm, yMm, tiltDeg }: Omit<BlockPlace, 'mirrored'>, line: Polyline): Polyline {
  // Leading edge up: clockwise, since x runs aft.
  const angle = (-tiltDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  return {
    x: line.x.map((x, i) => xMm + cos * x - sin * (line.y[i] ?? 0)),
    y: line.y.map((y, i) => yMm + sin * (line.x[i] ?? 0) + cos * y),
  };
}

/** The block's frame in the machine's: X from the origin along the bench, Y up. */
export function toMachine(machine: Machine, block: BlockPlan, line: Polyline): Polyline {
  const { blockXMm, blockYMm, trailingEdge } = machine;
  return {
    x: line.x.map((x) => (trailingEdge === 'origin' ? blockXMm + block.lengthMm - x : blockXMm + x)),
    y: line.y.map((y) => blockYMm + y),
  };
}

/** Places the core, or the pair, in the block and checks it with the margin at both faces. The kerf counts as part of the cut. */
export function fitBlock(plan: Plan, block: BlockPlan, core: Core): BlockFit {
  const turned = { xMm: 0, yMm: 0, tiltDeg: block.tiltDeg };
  const boxes = {
    root: grown(boxOf(toBlock(turned, core.root.path)), core.root.halfKerfMm),
    tip: grown(boxOf(toBlock(turned, core.tip.path)), core.tip.halfKerfMm),
  };
  const findings = [...spanFinding(plan, block), ...sizeFindings(block, boxes)];
  const lift = block.pair ? stackHeight(boxes, block.marginMm) : 0;
  const all = around(boxes.root, boxes.tip);
  const tooHigh = block.pair && all.maxY - all.minY + lift + 2 * block.marginMm > block.heightMm;
  if (tooHigh) {
    const needed = all.maxY - all.minY + lift + 2 * block.marginMm;
    const message = `A pair needs a block ${mm(needed, 1)} high, this one has ${mm(block.heightMm)}: one core is planned.`;
    findings.push(error('pair-does-not-fit', 'block.pair', message));
  }
  const pair = block.pair && !tooHigh;
  const first: BlockPlace = {
    xMm: block.coreXMm ?? (block.lengthMm - all.minX - all.maxX) / 2,
    yMm: block.coreYMm ?? (block.heightMm - all.minY - all.maxY - (pair ? lift : 0)) / 2,
    tiltDeg: block.tiltDeg,
    mirrored: false,
  };
  const marginMm = {
    root: least(sides(block, boxes.root, first, pair ? lift : 0)),
    tip: least(sides(block, boxes.tip, first, pair ? lift : 0)),
  };
  if (!findings.some(({ code }) => code === 'larger-than-block')) {
    for (const end of ENDS)
      findings.push(...marginFindings(block, sides(block, boxes[end], first, pair ? lift : 0), end));
  }
  const places = pair ? [first, { ...first, yMm: first.yMm + lift, mirrored: true }] : [first];
  return { places, marginMm, findings };
}

function grown(box: Box, by: number): Box {
  return { minX: box.minX - by, maxX: box.maxX + by, minY: box.minY - by, maxY: box.maxY + by };
}

function around(a: Box, b: Box): Box {
  return {
    minX: Math.min(a.minX, b.minX),
    maxX: Math.max(a.maxX, b.maxX),
    minY: Math.min(a.minY, b.minY),
    maxY: Math.max(a.maxY, b.maxY),
  };
}

/** How far the mirrored core must stand above the first so that the margin lies between them at both faces of the block. */
function stackHeight({ root, tip }: Record<End, Box>, marginMm: number): number {
  return Math.max(root.maxY - tip.minY, tip.maxY - root.minY) + marginMm;
}

type Side = 'front' | 'rear' | 'underside' | 'top';
type Sides = Readonly<Record<Side, number>>;

function sides(block: BlockPlan, box: Box, place: BlockPlace, lift: number): Sides {
  return {
    front: box.minX + place.xMm,
    rear: block.lengthMm - box.maxX - place.xMm,
    underside: box.minY + place.yMm,
    top: block.heightMm - box.maxY - place.yMm - lift,
  };
}

function least(of: Sides): number {
  return Math.min(...Object.values(of));
}

function spanFinding({ panel }: Plan, block: BlockPlan): Finding[] {
  if (block.spanMm >= panel.spanMm) return [];
  const message = `The block’s span of ${mm(block.spanMm)} is shorter than the panel’s ${mm(panel.spanMm)}.`;
  return [error('block-too-short', 'block.spanMm', message)];
}

function sizeFindings(block: BlockPlan, boxes: Record<End, Box>): Finding[] {
  return ENDS.flatMap((end) => {
    const { minX, maxX, minY, maxY } = boxes[end];
    return (
      [
        ['lengthMm', 'long', maxX - minX],
        ['heightMm', 'high', maxY - minY],
      ] as const
    ).flatMap(([field, word, size]) => {
      if (size <= block[field]) return [];
      const message = `The ${end} needs a block ${mm(size, 1)} ${word}, this one has ${mm(block[field])}.`;
      return [error('larger-than-block', `block.${field}`, message, { end })];
    });
  });
}

function marginFindings(block: BlockPlan, of: Sides, end: End): Finding[] {
  return (Object.keys(of) as Side[]).flatMap((side) => {
    const left = of[side];
    if (left >= block.marginMm - 1e-9) return [];
    const path = side === 'front' || side === 'rear' ? 'block.coreXMm' : 'block.coreYMm';
    return left < 0
      ? [error('outside-block', path, `The ${end} leaves the block by ${mm(-left)} at the ${side}.`, { end })]
      : [
          warning(
            'margin-too-small',
            path,
            `The ${end} keeps ${mm(left)} of foam at the ${side}, less than the margin of ${mm(block.marginMm)}.`,
            { end },
          ),
        ];
  });
}

/** What is cut out of what. */
export interface FoamAmounts {
  readonly blockVolumeMm3: number;
  readonly blockMassG: number;
  /** One core, its features taken out. */
  readonly coreVolumeMm3: number;
  readonly coreMassG: number;
}

/**
 * Volumes by the prismatoid formula and masses from the material's density. A slot's mouth is taken as flat between its edges.
 */
export function foamAmounts(plan: FoamPlan, core: Core, features: readonly PlacedFeature[]): FoamAmounts {
  const { block, panel, material } = plan;
  const blockVolumeMm3 = block.lengthMm * block.heightMm * block.spanMm;
  const taken = features.reduce(
    (sum, { root, tip }) => sum + ruledVolume(root.outline, tip.outline, panel.spanMm),
    0,
  );
  const coreVolumeMm3 = ruledVolume(core.root.core, core.tip.core, panel.spanMm) - taken;
  // 1 kg/m³ is 1e-6 g/mm³.
  const mass = (volume: number) => volume * material.densityKgM3 * 1e-6;
  return { blockVolumeMm3, blockMassG: mass(blockVolumeMm3), coreVolumeMm3, coreMassG: mass(coreVolumeMm3) };
}
