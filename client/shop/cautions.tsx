import { Caution } from '#client/ui/caution.tsx';
import { type ItemKind } from './form-values.ts';

const HOT_WIRE =
  'Hot wire burns, and hot polystyrene gives off styrene. Ventilate, use the lowest heat that cuts, keep an extinguisher at hand; never cut PVC or polyurethane foam.';
const MOVING =
  'The machine moves by itself. Check units and origin, run the program once with a cold wire, and keep the emergency stop in reach.';
const BED =
  'The machine moves by itself. Check units and origin, run the file once with the beam off or the cutter raised, keep the emergency stop in reach and never leave it alone: sheet can catch fire.';

/** What can hurt at a machine or with a material of this kind. */
export function KindCautions({ kind }: { kind: ItemKind }) {
  const sentences = {
    wire: [HOT_WIRE, MOVING],
    bow: [HOT_WIRE],
    foam: [HOT_WIRE],
    laser: [BED],
    router: [BED],
    sheet: [],
  }[kind];
  return sentences.map((sentence) => <Caution key={sentence}>{sentence}</Caution>);
}

/** Said wherever a kerf is read or set. */
export function KerfCaution() {
  return (
    <Caution>
      A default is common practice and no measurement. A test strip must confirm it: cut one on this machine,
      in this material, at this speed, and enter what you measure before you rely on it.
    </Caution>
  );
}
