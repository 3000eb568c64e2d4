import { saveAs } from 'file-saver';
import { useEffect, useRef, useState } from 'react';
import { receiveFile } from './receive-file.ts';

export type DownloadState =
  | { readonly step: 'idle' }
  | { readonly step: 'running'; readonly received: number; readonly total: number | null }
  | {
      readonly step: 'done';
      readonly fileName: string;
      readonly checksum: string | null;
      readonly verified: boolean;
    }
  | { readonly step: 'failed'; readonly error: unknown };

/**
 * Fetches a file, checks its bytes and hands it to the browser to be saved. Nothing is saved when the bytes are not those
 * the server announced. Closing the panel ends a download that is under way.
 */
export function useDownload(onDone: (fileName: string) => void) {
  const [state, setState] = useState<DownloadState>({ step: 'idle' });
  const running = useRef<AbortController | null>(null);
  useEffect(() => () => running.current?.abort(), []);

  const start = async (url: string) => {
    running.current?.abort();
    const control = new AbortController();
    running.current = control;
    setState({ step: 'running', received: 0, total: null });
    try {
      const file = await receiveFile(url, {
        signal: control.signal,
        onProgress: (received, total) => {
          if (!control.signal.aborted) setState({ step: 'running', received, total });
        },
      });
      if (control.signal.aborted) return;
      saveAs(new Blob([file.bytes], { type: file.mediaType }), file.fileName, { autoBom: false });
      setState({ step: 'done', fileName: file.fileName, checksum: file.checksum, verified: file.verified });
      onDone(file.fileName);
    } catch (error) {
      if (!control.signal.aborted) setState({ step: 'failed', error });
    }
  };
  const reset = () => {
    running.current?.abort();
    setState({ step: 'idle' });
  };
  return { state, start, reset };
}
