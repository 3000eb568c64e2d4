import { type SectionVersion } from '#server/contracts/sections.ts';
import { Moment } from '#client/ui/moment.tsx';
import { FactList } from './fact-list.tsx';

/** Who made the version, when, from what and why, and the checksum that tells its shape from every other. */
export function VersionRecord({ version }: { readonly version: SectionVersion }) {
  return (
    <>
      <p className="break-words">{version.note === '' ? 'Saved without a note.' : version.note}</p>
      <FactList
        facts={[
          ['Author', version.author.name],
          ['Saved', <Moment key="saved" at={version.createdAt} />],
          ['Based on', version.basedOn === null ? 'nothing earlier' : `version ${version.basedOn}`],
        ]}
      />
      <p>
        <span className="text-graphite">Shape checksum, sha-256</span>
        <span className="block font-semibold break-all">{version.checksum}</span>
      </p>
    </>
  );
}
