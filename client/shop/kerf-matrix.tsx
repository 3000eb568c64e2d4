import { Link } from 'react-router';
import { type Units, useUnits } from '#client/app/units.ts';
import { Moment } from '#client/ui/moment.tsx';
import { cuts, type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';
import { linkIdOf, searchOf, type ShopPlace } from './address.ts';
import { formatShopQuantity } from './quantities.ts';

export interface KerfMatrixProps {
  caption: string;
  machines: readonly Machine[];
  materials: readonly Material[];
  kerfs: readonly Kerf[];
  place: ShopPlace;
  archive: boolean;
  mayWrite: boolean;
}

/** Machines down, materials across; each crossing is the kerf of the pair. Wider than the screen, it scrolls by itself. */
export function KerfMatrix(props: KerfMatrixProps) {
  const { caption, machines, materials } = props;
  return (
    <div
      role="region"
      aria-label={caption}
      tabIndex={0}
      className="overflow-x-auto focus-visible:outline-offset-0"
    >
      <table className="border-collapse text-xs">
        <caption className="pb-1 text-left text-graphite">{caption}</caption>
        <thead>
          <tr className="border-b border-edge">
            <th scope="col" className="h-8 w-36 min-w-28 px-2 text-left font-normal text-graphite">
              Machine
            </th>
            {materials.map(({ id, name }) => (
              <th key={id} scope="col" className="w-54 min-w-50 px-2 text-left font-semibold wrap-break-word">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {machines.map((machine) => (
            <tr key={machine.id} className="border-b border-rule">
              <th
                scope="row"
                className="max-w-36 px-2 py-2 text-left align-top font-semibold wrap-break-word"
              >
                {machine.name}
              </th>
              {materials.map((material) => (
                <Crossing key={material.id} {...props} machine={machine} material={material} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

type CrossingProps = KerfMatrixProps & { machine: Machine; material: Material };

function Crossing({ machine, material, kerfs, place, archive, mayWrite }: CrossingProps) {
  const units = useUnits();
  if (!cuts(machine.settings.kind, material.settings.kind)) return <td />;
  const kerf = kerfs.find((one) => one.machineId === machine.id && one.materialId === material.id);
  const here = { at: 'kerf', machineId: machine.id, materialId: material.id } as const;
  const chosen = place.at === 'kerf' && place.machineId === machine.id && place.materialId === material.id;
  const value = kerf ? formatShopQuantity(kerf.kerfMm, 'length', units, 2) : 'none yet';
  return (
    <td
      className={`relative px-2 py-2 align-top hover:bg-sheet ${chosen ? 'bg-sheet shadow-[inset_3px_0_0_var(--wire)]' : ''}`}
    >
      {mayWrite ? (
        <Link
          id={linkIdOf(here)}
          to={searchOf(here, archive)}
          preventScrollReset
          aria-label={`Kerf of ${machine.name} in ${material.name}: ${value}`}
          aria-current={chosen ? 'true' : undefined}
          className={`block text-sm underline decoration-rule underline-offset-4 after:absolute after:inset-0 ${kerf ? 'font-semibold' : 'text-graphite'}`}
        >
          {value}
        </Link>
      ) : (
        <span className={`block text-sm ${kerf ? 'font-semibold' : 'text-graphite'}`}>{value}</span>
      )}
      {kerf && <Origin kerf={kerf} units={units} />}
    </td>
  );
}

/** At which speed it holds, and whether anybody measured it: by mark and word beside colour. */
function Origin({ kerf, units }: { kerf: Kerf; units: Units }) {
  return (
    <>
      <span className="block text-graphite">
        {kerf.speedMmMin === null ? 'by hand' : `at ${formatShopQuantity(kerf.speedMmMin, 'feed', units, 0)}`}
      </span>
      {kerf.measuredOn === null ? (
        <span className="block text-amber">◌ default, not measured</span>
      ) : (
        <span className="block text-spruce">
          ● measured <Moment at={`${kerf.measuredOn}T12:00:00`} />
          <span className="block text-graphite">{kerf.by.name}</span>
        </span>
      )}
    </>
  );
}
