import { useState } from 'react';
import { sectionNameSchema } from '#server/contracts/common.ts';
import { useChangeSection } from '#client/api/sections.ts';
import { fieldErrors } from '#client/api/request.ts';

interface SectionNameProps {
  readonly sectionId: string;
  readonly name: string;
}

/** The name of the section, changed in place: press it and type. */
export function SectionName({ sectionId, name }: SectionNameProps) {
  const [typing, setTyping] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const change = useChangeSection(sectionId);
  const shown = change.isPending ? change.variables.name : undefined;
  const commit = () => {
    if (typing === null) return;
    const read = sectionNameSchema.safeParse(typing);
    if (!read.success) setRefusal(read.error.issues[0]?.message ?? 'This is no name.');
    else if (read.data === name) setTyping(null);
    else {
      change.mutate(
        { name: read.data },
        {
          onSuccess: () => setTyping(null),
          onError: (error) => setRefusal(fieldErrors(error).get('name') ?? error.message),
        },
      );
    }
  };
  if (typing === null) {
    const start = () => {
      setRefusal(null);
      setTyping(name);
    };
    return <ShownName name={shown ?? name} onPress={start} />;
  }
  return (
    <div className="min-w-0">
      <input
        type="text"
        aria-label="Name of the section"
        aria-invalid={refusal !== null}
        value={typing}
        maxLength={200}
        autoFocus
        disabled={change.isPending}
        onFocus={(event) => event.target.select()}
        onChange={(event) => {
          setTyping(event.target.value);
          setRefusal(null);
        }}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Enter') commit();
          if (event.key === 'Escape') setTyping(null);
        }}
        style={{ width: `${Math.min(48, Math.max(12, typing.length + 2))}ch` }}
        className="-my-0.5 -ml-2 max-w-full rounded border border-wire bg-sheet px-2 text-xl font-extrabold aria-invalid:border-brick"
      />
      {refusal !== null && (
        <p role="alert" className="text-xs text-brick">
          {refusal}
        </p>
      )}
    </div>
  );
}

function ShownName({ name, onPress }: { name: string; onPress: () => void }) {
  return (
    <h1 className="min-w-0 text-xl font-extrabold">
      <button
        type="button"
        title="Change the name"
        onClick={onPress}
        className="max-w-full cursor-text rounded text-left break-words decoration-edge decoration-dotted underline-offset-4 hover:underline"
      >
        {name}
      </button>
    </h1>
  );
}
