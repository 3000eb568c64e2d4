import { useQuery } from '@tanstack/react-query';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { cutSheetQuery, useReleaseSheetVersion, useWithdrawSheetVersion } from '#client/api/cut-sheets.ts';
import { StatusDialog } from '#client/versions/status-dialog.tsx';
import { partsText, StaleNotice } from '../source-words.tsx';

interface SheetDialogProps {
  readonly version: SheetVersion;
  readonly onClose: () => void;
}

/** Puts a cut sheet on the cutting list; says which version it takes the place of. */
export function ReleaseSheetDialog({ version, onClose }: SheetDialogProps) {
  const action = useReleaseSheetVersion(version.sheetId);
  const { data } = useQuery(cutSheetQuery(version.sheetId));
  const before = data?.releasedNumber ?? null;
  return (
    <StatusDialog step="release" number={version.number} action={action} onClose={onClose}>
      <p>
        {version.sheetName}: {partsText(version.parts)}, {version.plan.quantity} wanted. Its files are made
        now and stay as they are; it stands on the cutting list as soon as it is released.
        {before !== null && ` Version ${String(before)}, in force now, will be superseded.`}
      </p>
      <StaleNotice ends={version} />
    </StatusDialog>
  );
}

/** Takes a released cut sheet off the cutting list. */
export function WithdrawSheetDialog({ version, onClose }: SheetDialogProps) {
  const action = useWithdrawSheetVersion(version.sheetId);
  return (
    <StatusDialog step="withdraw" number={version.number} action={action} onClose={onClose}>
      {version.sheetName} leaves the cutting list; parts already begun stay on it and say why. Files already
      taken are not called back: tell the people at the machines.
    </StatusDialog>
  );
}
