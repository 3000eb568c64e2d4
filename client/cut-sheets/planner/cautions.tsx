import { type MachineKind } from '#server/contracts/shop.ts';
import { Caution } from '#client/ui/caution.tsx';

interface CautionsProps {
  /** What cuts the core, and what the ribs; null where nothing does. */
  readonly machine: MachineKind | null;
  readonly ribMachine: MachineKind | null;
}

/** What can hurt in the cuts that are planned, where the wire runs. */
export function Cautions({ machine, ribMachine }: CautionsProps) {
  const sentences = [
    ...(machine === 'wire' || machine === 'bow'
      ? ['Hot wire burns and its fumes harm: ventilate, keep an extinguisher at hand.']
      : []),
    ...(machine === 'wire' ? ['First run it with a cold wire, the emergency stop in reach.'] : []),
    ...(ribMachine === 'laser' || ribMachine === 'router'
      ? [`First run the ribs with the ${RESTING[ribMachine]}, and never leave the machine alone.`]
      : []),
  ];
  if (sentences.length === 0) return null;
  return <Caution className="print:hidden">{sentences.join(' ')}</Caution>;
}

const RESTING = { laser: 'beam off', router: 'cutter raised' } as const;
