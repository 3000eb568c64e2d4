import { type MachineKind } from '#server/contracts/shop.ts';
import { Caution } from '#client/ui/caution.tsx';

/** What can hurt in the cut that is planned, where the wire runs. */
export function Cautions({ machine }: { machine: MachineKind | null }) {
  if (machine !== 'wire' && machine !== 'bow') return null;
  return (
    <Caution className="print:hidden">
      Hot wire burns and its fumes harm: ventilate, keep an extinguisher at hand.
      {machine === 'wire' && ' First run it with a cold wire, the emergency stop in reach.'}
    </Caution>
  );
}
