import { type Point } from '../point.ts';
import { type Polyline, at, boxOf, polylineOf } from './arrays.ts';
import { type Core } from './core.ts';
import { verticalCut } from './feature-ends.ts';
import { type Finding, error, mm, note } from './findings.ts';
import { offsetBoth } from './tail.ts';
import { ENDS, type End, type Plan, type TemplatePlan } from './plan.ts';
import { PART } from './row.ts';

/** A numbered mark on the template's edge: both people call it out when their end of the wire passes it. */
export interface Tick {
  readonly number: number;
  /** Chord station, 0 … 1. */
  readonly station: number;
  readonly surface: 'upper' | 'lower';
  readonly at: Point;
  /** Unit direction into the template. */
  readonly inwards: Point;
}

/** A template to glide a wire bow along, in the panel's frame at its end. */
export interface Template {
  readonly end: End;
  /** Closed, counter-clockwise, ramp included. */
  readonly outline: Polyline;
  readonly ticks: readonly Tick[];
  readonly pins: readonly Point[];
  readonly pinDiameterMm: number;
  /** Level line: both templates are set up with it parallel to the board, which keeps the washout. */
  readonly reference: Polyline;
  /** Length of the ramp behind the trailing edge, mm: in proportion to the chords, so both ends of the wire arrive together. */
  readonly rampMm: number;
}

/**
 * Root and tip template. The wire glides along the edge, so the edge is the wire's path less the wire's radius: the contour less the skins, half
 * the kerf wider, half the wire's diameter narrower. Ticks stand at equal chord stations and carry the same numbers at both ends, in
 * the order of the cut: from the trailing edge over the upper surface to the nose and back by the lower.
 */
export function buildTemplates(
  plan: Plan,
  core: Core,
  rules: TemplatePlan,
): { readonly templates: Template[]; readonly findings: Finding[] } {
  const by = (end: End) => plan.kerfMm[end] / 2 - rules.wireDiameterMm / 2;
  const lines = offsetBoth(core.panel, { root: by('root'), tip: by('tip') }, []);
  const templates: Template[] = [];
  const findings: Finding[] = [];
  for (const end of ENDS) {
    const line = lines[end];
    if (!line) {
      const message = `Nothing is left of the template at the ${end}.`;
      findings.push(error('skin-thicker-than-section', 'allowances.upperMm', message, { end }));
      continue;
    }
    const { outline, rampMm, tongueMm } = withRamp(core, end, line, rules);
    if (tongueMm < THIN_TONGUE_MM) {
      const message = `The ramp of the ${end} template is ${mm(tongueMm)} thick at the trailing edge: back it up.`;
      findings.push(note('thin-ramp', 'template.rampFraction', message, { end }));
    }
    const pins = pinsOf(core, end, line, rules, findings);
    const box = boxOf(line);
    const y = core.panel[end].toPanel({ x: plan.panel.washoutStation, y: 0 }).y;
    const reference = polylineOf([
      { x: box.minX, y },
      { x: box.maxX, y },
    ]);
    const ticks = ticksOf(core, end, line, rules.ticks);
    templates.push({ end, outline, ticks, pins, pinDiameterMm: rules.pinDiameterMm, reference, rampMm });
  }
  return { templates, findings };
}

/** A ramp thinner than this needs a backing; common practice. */
const THIN_TONGUE_MM = 2;

/** The outline with a tongue behind the trailing edge, along which the wire comes in over the upper and leaves by the lower edge. */
function withRamp(core: Core, end: End, line: Polyline, rules: TemplatePlan) {
  const { chain } = core.panel;
  const face = chain[end];
  const rampMm = rules.rampFraction * core.panel[end].chordMm;
  const last = chain.station.length - 1;
  const [ax, ay] = [at(face.nx, 0), at(face.ny, 0)];
  const inner = Array.from(chain.part.keys()).filter((i) => chain.part[i] !== PART.tail);
  const [first, final] = [inner[0] ?? 0, inner.at(-1) ?? last];
  const point = (i: number): Point => ({ x: at(line.x, i), y: at(line.y, i) });
  const [upper, lower] = [point(first), point(final)];
  const outer = ({ x, y }: Point): Point => ({ x: x + rampMm * ax, y: y + rampMm * ay });
  const outline = polylineOf([outer(upper), ...inner.map(point), outer(lower)]);
  return { outline, rampMm, tongueMm: Math.hypot(upper.x - lower.x, upper.y - lower.y) };
}

function ticksOf({ panel }: Core, end: End, line: Polyline, count: number): Tick[] {
  const { chain } = panel;
  const face = chain[end];
  const ticks: Tick[] = [];
  const add = (surface: 'upper' | 'lower', station: number) => {
    const part = PART[surface];
    const pairs = Array.from(chain.part.keys()).filter(
      (i) => chain.part[i] === part || chain.part[i] === PART.nose,
    );
    const k = pairs.findIndex((i, n) => {
      const next = pairs[n + 1];
      return (
        next !== undefined && (at(chain.station, i) - station) * (at(chain.station, next) - station) <= 0
      );
    });
    const [a, b] = [pairs[k], pairs[k + 1]];
    if (a === undefined || b === undefined) return;
    const way = at(chain.station, b) - at(chain.station, a);
    const share = way === 0 ? 0 : (station - at(chain.station, a)) / way;
    const mix = (of: Float64Array) => at(of, a) + share * (at(of, b) - at(of, a));
    const [nx, ny] = [mix(face.nx), mix(face.ny)];
    const size = Math.hypot(nx, ny);
    const inwards = { x: -nx / size, y: -ny / size };
    ticks.push({
      number: ticks.length + 1,
      station,
      surface,
      at: { x: mix(line.x), y: mix(line.y) },
      inwards,
    });
  };
  for (let k = 0; k <= count; k++) add('upper', 1 - k / count);
  for (let k = 1; k <= count; k++) add('lower', k / count);
  return ticks;
}

function pinsOf(
  { panel }: Core,
  end: End,
  line: Polyline,
  rules: TemplatePlan,
  findings: Finding[],
): Point[] {
  return rules.pinStations.flatMap((station, i) => {
    const { x } = panel[end].toPanel({ x: station, y: 0 });
    const cut = verticalCut(line, x);
    if (cut && cut.high - cut.low > 2 * rules.pinDiameterMm) return [{ x, y: (cut.low + cut.high) / 2 }];
    const message = `Pin ${i + 1} has no room in the ${end} template.`;
    findings.push(error('pin-outside-template', `template.pinStations.${i}`, message, { end, station }));
    return [];
  });
}
