import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { ChecksumError } from './receive-file.ts';
import { type DownloadState } from './use-download.ts';

/** What became of the download, said where it was started; before it, in the same place, what a download leaves behind. */
export function DownloadReport({ state }: { readonly state: DownloadState }) {
  return <div className="min-h-10 text-xs">{noticeOf(state)}</div>;
}

function noticeOf(state: DownloadState) {
  switch (state.step) {
    case 'idle':
      return <p className="text-graphite">Each download is kept on record: who took which file, and when.</p>;
    case 'running':
      return <p>{progressOf(state.received, state.total)}</p>;
    case 'done':
      return (
        <Notice tone="good">
          Saved {state.fileName}. {state.verified ? 'Its bytes match their checksum.' : UNVERIFIED}
        </Notice>
      );
    case 'failed':
      return <Notice tone="error">{failureOf(state.error)}</Notice>;
  }
}

const UNVERIFIED = 'The bytes could not be checked here: compare the checksum of the saved file yourself.';

function progressOf(received: number, total: number | null): string {
  const kilobytes = (bytes: number) => `${(bytes / 1000).toFixed(1)} kB`;
  return total === null
    ? `Fetching: ${kilobytes(received)}`
    : `Fetching: ${kilobytes(received)} of ${kilobytes(total)}`;
}

function failureOf(error: unknown): string {
  if (error instanceof ChecksumError) {
    return 'The bytes that arrived do not match their checksum, so nothing was saved. Download again.';
  }
  return `${sentenceOf(error)} Nothing was saved; your settings are kept.`;
}
