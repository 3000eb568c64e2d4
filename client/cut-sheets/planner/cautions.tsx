import { type MachineKind } from '#server/contracts/shop.ts';
import { Caution } from '#client/ui/caution.tsx';

/** What can hurt in the cut that is planned, where the wire runs. */
export function Cautions({ machine }: { machine: MachineKind | null }) {
  if (machine !== 'wire' && machine !== 'bow') return null;
  return (
    <Caution className="print:hidden">
      Hot wire burns, and hot foam gives off fumes: ventilate, keep an extinguisher at hand.
      {machine === 'wire' &&
        ' Run the program once with a cold wire, with the emergency stop in reach; check units and origin.'}
    </Caution>
  );
}
