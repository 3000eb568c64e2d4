import { useMutation } from '@tanstack/react-query';
import { type DragEvent, type SubmitEvent, useId, useRef, useState } from 'react';
import { useNavigate } from 'react-router';
import { type FileCheck } from '#server/contracts/cutting-list.ts';
import { checkFile } from '#client/api/cutting-list.ts';
import { sha256 } from '#client/app/sha256.ts';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { fieldClass } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { FileVerdict } from './file-verdict.tsx';

const NO_HASH = 'This browser cannot check files over plain http. Type the printed code instead.';

/** Is this file current? By dropping any downloaded file, or by the code printed on a sheet or template. */
export function FileCheckPanel() {
  const navigate = useNavigate();
  const [over, setOver] = useState(false);
  const check = useMutation({
    mutationFn: async (asked: File | string): Promise<{ what: string; verdict: FileCheck }> => {
      if (typeof asked === 'string') return { what: asked, verdict: await checkFile({ code: asked }) };
      const checksum = await sha256(await asked.arrayBuffer());
      if (checksum === null) throw new Error(NO_HASH);
      return { what: asked.name, verdict: await checkFile({ checksum }) };
    },
  });
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    const [file] = event.dataTransfer.files;
    if (file) check.mutate(file);
  };
  const ask = (text: string) => {
    // A scanner types the whole address that the code on the template holds.
    const address = /\/cut-sheets\/[0-9a-f-]{36}\/versions\/\d+$/i.exec(text.trim())?.[0];
    if (address) void navigate(address);
    else check.mutate(text.trim());
  };
  return (
    <section
      aria-label="Is this file current?"
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={`flex flex-col gap-3 rounded border border-dashed px-4 py-3 ${over ? 'border-wire bg-foam' : 'border-edge'}`}
    >
      <div className="flex flex-wrap items-end gap-x-6 gap-y-3">
        <div className="min-w-0 flex-1 basis-72">
          <h2 className="text-lg font-semibold">Is this file current?</h2>
          <p className="text-graphite">Drop a downloaded file here, choose it, or type the printed code.</p>
        </div>
        <ChooseFile onFile={(file) => check.mutate(file)} />
        <CodeForm busy={check.isPending} onAsk={ask} />
      </div>
      <div aria-live="polite">
        {check.isPending && <p className="text-base">Looking it up…</p>}
        {check.isError && <Notice tone="error">{sentenceOf(check.error)}</Notice>}
        {check.isSuccess && <FileVerdict what={check.data.what} verdict={check.data.verdict} />}
      </div>
    </section>
  );
}

function ChooseFile({ onFile }: { readonly onFile: (file: File) => void }) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <input
        ref={input}
        type="file"
        hidden
        aria-label="File to check"
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          if (file) onFile(file);
          event.target.value = '';
        }}
      />
      <Button size="large" onClick={() => input.current?.click()}>
        Choose a file…
      </Button>
    </>
  );
}

function CodeForm({ busy, onAsk }: { readonly busy: boolean; readonly onAsk: (text: string) => void }) {
  const id = useId();
  const [text, setText] = useState('');
  const submit = (event: SubmitEvent) => {
    event.preventDefault();
    if (text.trim() !== '') onAsk(text);
  };
  return (
    <form onSubmit={submit} className="flex items-end gap-2">
      <div className="flex flex-col gap-1">
        <label htmlFor={id} className="text-xs text-graphite">
          Code on the sheet
        </label>
        <input
          id={id}
          value={text}
          onChange={(event) => setText(event.target.value)}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          placeholder="7K3M-Q9XD"
          className={`${fieldClass} h-12 w-44 text-lg tracking-wider uppercase`}
        />
      </div>
      <Button size="large" type="submit" busy={busy}>
        Check
      </Button>
    </form>
  );
}
