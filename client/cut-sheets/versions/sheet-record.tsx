import { Link } from 'react-router';
import { type SheetSource, type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { Moment } from '#client/ui/moment.tsx';
import { FactList } from '#client/versions/fact-list.tsx';
import { versionPath } from '#client/versions/standing.tsx';
import { partsText } from '../source-words.tsx';

/** Who made the version, when, from what and why, and the checksum that tells its plan from every other. */
export function SheetRecord({ version }: { readonly version: SheetVersion }) {
  const { machine, material, ribMachine, ribMaterial } = version;
  return (
    <>
      <p className="break-words">{version.note === '' ? 'Saved without a note.' : version.note}</p>
      <FactList
        facts={[
          ['Root', <Source key="root" source={version.root} />],
          ['Tip', <Source key="tip" source={version.tip} />],
          ['Makes', partsText(version.parts)],
          ['Panels wanted', String(version.plan.quantity)],
          ['Machine', machine?.name ?? 'none, by hand'],
          ['Foam', material?.name ?? 'none'],
          ...(ribMachine === null ? [] : [['Ribs on', ribMachine.name] as const]),
          ...(ribMaterial === null ? [] : [['Rib material', ribMaterial.name] as const]),
          ['Author', version.author.name],
          ['Saved', <Moment key="saved" at={version.createdAt} />],
          ['Based on', version.basedOn === null ? 'nothing earlier' : `version ${String(version.basedOn)}`],
        ]}
      />
      <p>
        <span className="text-graphite">Checksum of the plan, sha-256</span>
        <span className="block font-semibold break-all">{version.checksum}</span>
      </p>
    </>
  );
}

function Source({ source }: { readonly source: SheetSource }) {
  return (
    <Link className="underline underline-offset-4" to={versionPath(source.sectionId, source.versionNumber)}>
      {source.sectionName} v{source.versionNumber}
    </Link>
  );
}
