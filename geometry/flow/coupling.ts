import { type PanelSystem, strengthsAt } from './inviscid.ts';
import { PointView } from './panel-influence.ts';
import { WAKE_NODES, type Wake, ownWakeSpeed, traceWake, wakeSpeed, wakeStream } from './wake.ts';

/** How the outer flow answers to the layer's mass defects at one angle. */
export interface OuterFlow {
  readonly alpha: number;
  readonly wake: Wake;
  /** Speeds without a layer at all nodes: vortex strengths on the surface, speeds in the wake. */
  readonly inviscid: Float64Array;
  /** Change of those speeds per signed mass defect ue δ* (+ above, − below, + in the wake) at each node: size × size. */
  readonly influence: Float64Array;
  /** Nodes on the surface and in the wake. */
  readonly size: number;
}

/**
 * The influence of mass defects m = ue δ* (Lighthill, J. Fluid Mech. 4, 1958: the layer displaces the flow like sources dm/ds on the
 * surface): a panel carries (M_j − M_{j+1})/L_j with the signed defects M, whichever way the flow runs, so that the surface's part is found
 * once for a section.
 */
export class Coupling {
  readonly system: PanelSystem;
  private readonly surface: Float64Array;

  /** @param system set up with sources */
  constructor(system: PanelSystem) {
    this.system = system;
    const { panels, matrix, sources } = system;
    const n = panels.nodes;
    const columns = n - 1;
    const strengths = new Float64Array((n + 1) * columns);
    if (sources) for (let i = 0; i < sources.length; i++) strengths[i] = -(sources[i] ?? 0);
    matrix.solve(strengths, columns);
    this.surface = new Float64Array(n * n);
    for (let i = 0; i < n; i++) differences(strengths, i * columns, panels.length, this.surface, i * n, 1);
  }

  /** The outer flow at an angle, wake included. @param alpha radians */
  at(alpha: number): OuterFlow {
    const { system, surface } = this;
    const { panels } = system;
    const n = panels.nodes;
    const size = n + WAKE_NODES;
    const strengths = strengthsAt(system, alpha);
    const wake = traceWake(panels, strengths, alpha);
    const influence = new Float64Array(size * size);
    const inviscid = new Float64Array(size);
    inviscid.set(strengths);
    const columns = this.wakeColumns(wake);
    for (let i = 0; i < n; i++) {
      influence.set(surface.subarray(i * n, (i + 1) * n), i * size);
      differences(columns, i * (WAKE_NODES - 1), wake.length, influence, i * size + n, -1);
    }
    influence.copyWithin(n * size, 0, size);
    inviscid[n] = strengths[0] ?? 0;
    this.wakeRows(wake, alpha, influence, inviscid);
    return { alpha, wake, inviscid, influence, size };
  }

  /** Vortex strengths per unit source strength of the wake's panels. */
  private wakeColumns(wake: Wake): Float64Array {
    const { panels, matrix } = this.system;
    const n = panels.nodes;
    const count = wake.nodes - 1;
    const columns = new Float64Array((n + 1) * count);
    for (let i = 0; i < n; i++) {
      const [x, y] = [panels.x[i] ?? 0, panels.y[i] ?? 0];
      for (let p = 0; p < count; p++) columns[i * count + p] = -wakeStream(wake, p, x, y);
    }
    if (panels.edge.sharp) {
      const { edge } = panels;
      const { x, y } = this.system.inside;
      for (let p = 0; p < count; p++) {
        columns[(n - 1) * count + p] = -wakeSpeed(wake, p, x, y, edge.bx, edge.by);
      }
    }
    matrix.solve(columns, count);
    return columns;
  }

  /** Speeds at the wake's nodes; the first takes those of the upper trailing edge. */
  private wakeRows(wake: Wake, alpha: number, influence: Float64Array, inviscid: Float64Array): void {
    const { panels } = this.system;
    const n = panels.nodes;
    const size = n + wake.nodes;
    const view = new PointView(panels);
    const vortex = new Float64Array(n);
    const source = new Float64Array(n - 1);
    const own = new Float64Array(wake.nodes - 1);
    for (let k = 1; k < wake.nodes; k++) {
      const [x, y] = [wake.x[k] ?? 0, wake.y[k] ?? 0];
      const [ux, uy] = [wake.ux[k] ?? 0, wake.uy[k] ?? 0];
      view.look(x, y);
      view.speedRow(ux, uy, vortex, 0, source, 0);
      const row = (n + k) * size;
      let speed = Math.cos(alpha) * ux + Math.sin(alpha) * uy;
      for (let i = 0; i < n; i++) {
        const factor = vortex[i] ?? 0;
        speed += factor * (inviscid[i] ?? 0);
        const from = i * size;
        for (let j = 0; j < size; j++)
          influence[row + j] = (influence[row + j] ?? 0) + factor * (influence[from + j] ?? 0);
      }
      inviscid[n + k] = speed;
      for (let p = 0; p < wake.nodes - 1; p++) {
        own[p] = p === k || p === k - 1 ? ownWakeSpeed(wake, k, p) : wakeSpeed(wake, p, x, y, ux, uy);
      }
      differences(source, 0, panels.length, influence, row, 1);
      differences(own, 0, wake.length, influence, row + n, -1);
    }
  }
}

/**
 * Adds to a row of the influence what one row of source influences means for the defects at the panels' ends.
 * @param sign +1 on the surface, whose panels run against the upper flow; −1 in the wake
 */
function differences(
  sources: Float64Array,
  at: number,
  length: Float64Array,
  row: Float64Array,
  rowAt: number,
  sign: 1 | -1,
): void {
  for (let p = 0; p < length.length; p++) {
    const value = (sign * (sources[at + p] ?? 0)) / (length[p] ?? 1);
    row[rowAt + p] = (row[rowAt + p] ?? 0) + value;
    row[rowAt + p + 1] = (row[rowAt + p + 1] ?? 0) - value;
  }
}
