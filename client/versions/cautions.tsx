import { type ExportFormat } from '#geometry/formats/export.ts';
import { Caution } from '#client/ui/caution.tsx';

interface ExportCautionsProps {
  readonly format: ExportFormat;
  /** The file holds fractions of chord instead of mm. */
  readonly unitChord: boolean;
}

/** What to mind before these files reach a machine; it stands beside the button that fetches them. */
export function ExportCautions({ format, unitChord }: ExportCautionsProps) {
  return (
    <Caution className="flex flex-col gap-1.5">
      <p>
        {unitChord ? 'Check units and origin: this file is in fractions of chord and must be scaled.' : units}
      </p>
      <p>Run the program once with a cold wire, or with the beam off. Keep the emergency stop in reach.</p>
      <p>
        A hot wire burns, and hot polystyrene gives off styrene: ventilate, use the lowest heat that cuts,
        keep an extinguisher at hand.
      </p>
      <p>Laser: never cut PVC, polyurethane or a foam you do not know, and keep watch while it runs.</p>
      {format === 'svg' && (
        <p>Printed as a template: print at 100 % and measure the chord on paper before cutting.</p>
      )}
    </Caution>
  );
}

const units =
  'Check units and origin: the file is in mm, whatever unit this page shows; its chord line begins at x = 0 on y = 0.';
