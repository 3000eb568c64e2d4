import { type ReactNode } from 'react';
import { useChangePreferences } from '#client/api/me.ts';
import { THEMES } from '#client/app/theme.ts';
import { useTheme } from '#client/app/use-theme.ts';
import { useMe } from '#client/app/session.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { type Segment, SegmentedControl } from '#client/ui/segmented-control.tsx';
import { type Me, type Preferences } from '#server/contracts/people.ts';
import { PasswordForm } from './password-form.tsx';

const UNITS: readonly Segment<Preferences['units']>[] = [
  { value: 'mm', label: 'mm' },
  { value: 'inch', label: 'inch' },
];

export function Component() {
  const me = useMe();
  return (
    <div data-page="flowing" className="mx-auto w-full max-w-160 px-4 pt-4 pb-12">
      <title>Account · Ribwright</title>
      <h1 className="text-xl font-extrabold">Account</h1>
      <Part title="Person">
        <dl className="grid grid-cols-[7rem_minmax(0,1fr)] gap-y-1">
          <Fact name="Name" value={me.name} />
          <Fact name="E-mail" value={me.email} />
          <Fact name="Role" value={me.role} />
          <Fact name="Workshop" value={me.workshop.name} />
        </dl>
      </Part>
      <Part title="On the screen">
        <PreferenceFields me={me} />
      </Part>
      <Part title="Password">
        <PasswordForm me={me} />
      </Part>
    </div>
  );
}

function PreferenceFields({ me }: { me: Me }) {
  const change = useChangePreferences();
  const { theme, choose, failure } = useTheme(me);
  const units = change.isPending ? (change.variables.units ?? me.preferences.units) : me.preferences.units;
  const error = change.error ?? failure;
  return (
    <div className="flex max-w-80 flex-col gap-4">
      <SegmentedControl
        label="Lengths"
        segments={UNITS}
        value={units}
        onChange={(value) => {
          change.mutate({ units: value });
        }}
      />
      <p className="-mt-3 text-xs text-graphite">Cut files are always in mm.</p>
      <SegmentedControl label="Theme" segments={THEMES} value={theme} onChange={choose} />
      {error && <Notice tone="error">The choice was not kept. {sentenceOf(error)}</Notice>}
    </div>
  );
}

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="mt-8">
      <h2 className="mb-3 border-b border-rule pb-1 text-xs font-semibold text-graphite uppercase">
        {title}
      </h2>
      {children}
    </section>
  );
}

function Fact({ name, value }: { name: string; value: string }) {
  return (
    <>
      <dt className="text-graphite">{name}</dt>
      <dd className="font-semibold wrap-break-word">{value}</dd>
    </>
  );
}
