import { CoupledLayer } from '#geometry/flow/coupled.ts';
import { checkConditions, type ViscousInput } from '#geometry/flow/conditions.ts';
import { type Coupling, type OuterFlow } from '#geometry/flow/coupling.ts';
import { Layer } from '#geometry/flow/layer.ts';
import { panelOutline } from '#geometry/flow/panels.ts';
import { prepareSection } from '#geometry/flow/viscous.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { naca4 } from '#tests/geometry/shapes/samples.ts';

/** A 4-digit section with closed trailing edge made ready for the boundary layer. */
export function prepared(digits: string, panels = 160, edge: 'open' | 'closed' = 'closed'): Coupling {
  return prepareSection(panelOutline(outlineOf(naca4(digits, edge)), panels));
}

/** A layer on a section at an angle, started from nothing and not yet coupled. */
export function started(
  section: Coupling,
  alphaDeg: number,
  input: ViscousInput,
): { readonly coupled: CoupledLayer; readonly layer: Layer; readonly outer: OuterFlow } {
  const outer = section.at((alphaDeg * Math.PI) / 180);
  const coupled = new CoupledLayer(new Layer(section.system.panels, outer.size, checkConditions(input)));
  coupled.start(outer);
  return { coupled, layer: coupled.layer, outer };
}
