import { useQuery } from '@tanstack/react-query';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { sectionQuery, useReleaseVersion, useWithdrawVersion } from '#client/api/sections.ts';
import { StatusDialog } from './status-dialog.tsx';

interface VersionDialogProps {
  readonly version: SectionVersion;
  readonly onClose: () => void;
}

/** Puts a version in force; says which one it takes the place of. */
export function ReleaseDialog({ version, onClose }: VersionDialogProps) {
  const action = useReleaseVersion(version.sectionId);
  return (
    <StatusDialog step="release" number={version.number} action={action} onClose={onClose}>
      {version.sectionName}, {version.description}. Its files may be cut as soon as it is released.{' '}
      <Succession version={version} />
    </StatusDialog>
  );
}

/** Takes a released version out of force. */
export function WithdrawDialog({ version, onClose }: VersionDialogProps) {
  const action = useWithdrawVersion(version.sectionId);
  return (
    <StatusDialog step="withdraw" number={version.number} action={action} onClose={onClose}>
      {version.sectionName}, {version.description}. After this no version of the section is in force until
      another is released. Files already taken are not called back: tell the people at the machines.
    </StatusDialog>
  );
}

function Succession({ version }: { readonly version: SectionVersion }) {
  const { data } = useQuery(sectionQuery(version.sectionId));
  if (!data) return null;
  if (data.releasedNumber === null) return <>No version of this section is in force now.</>;
  return <>Version {data.releasedNumber}, in force now, will be superseded.</>;
}
