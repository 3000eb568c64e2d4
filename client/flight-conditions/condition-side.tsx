import { type ReactNode, useEffect, useRef } from 'react';
import { useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { Moment } from '#client/ui/moment.tsx';
import { type StoredCondition } from '#server/contracts/flight-conditions.ts';
import { linkIdOf } from './address.ts';
import { ConditionForm } from './condition-form.tsx';
import { Figures } from './figures.tsx';
import { FIELDS, fieldsOf, textsOf } from './form-values.ts';
import { useConditionForm } from './use-condition-form.ts';

export interface ConditionSideProps {
  /** Null for a new one. */
  stored: StoredCondition | null;
  /** Somebody went there, so that it takes the focus; the default stands there of itself. */
  wanted: boolean;
  mayWrite: boolean;
  onClose: () => void;
  onSaved: (now: StoredCondition) => void;
}

/** One flight condition, and beside it what follows from it. */
export function ConditionSide(props: ConditionSideProps) {
  const { stored, wanted, mayWrite, onClose } = props;
  const title = stored?.name ?? 'New flight condition';
  return (
    <Frame
      title={title}
      under={stored && <Changed stored={stored} />}
      wanted={wanted}
      returnTo={linkIdOf(stored?.id ?? 'new')}
      onClose={onClose}
    >
      {mayWrite ? <Written {...props} /> : stored && <Read stored={stored} />}
    </Frame>
  );
}

const COLUMNS = 'grid gap-x-8 gap-y-6 xl:grid-cols-[24rem_minmax(0,40rem)]';

function Written({ stored, onSaved }: ConditionSideProps) {
  const api = useConditionForm(stored, onSaved);
  return (
    <div className={COLUMNS}>
      <ConditionForm stored={stored} api={api} />
      <Figures {...api.figures} />
    </div>
  );
}

/** For those who may not change it. */
function Read({ stored }: { stored: StoredCondition }) {
  const texts = textsOf(stored.name, stored.settings, useUnits());
  return (
    <div className={COLUMNS}>
      <dl>
        {fieldsOf(texts).map((field) => (
          <div key={field} className="flex justify-between gap-4 py-0.5">
            <dt className="text-graphite">{FIELDS[field].label}</dt>
            <dd className="text-right font-semibold">{texts[field] === '' ? 'free' : texts[field]}</dd>
          </div>
        ))}
      </dl>
      <Figures condition={stored.settings} older={false} />
    </div>
  );
}

interface FrameProps {
  title: string;
  under: ReactNode;
  wanted: boolean;
  returnTo: string;
  onClose: () => void;
  children: ReactNode;
}

/** Takes the focus when somebody goes there, and gives it back to where it was opened. */
export function Frame({ title, under, wanted, returnTo, onClose, children }: FrameProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    if (!wanted) return;
    heading.current?.focus();
    return () => document.getElementById(returnTo)?.focus();
  }, [wanted, returnTo]);
  return (
    <section aria-label={title} className="flex flex-col gap-4">
      <header className="flex items-start justify-between gap-3">
        <div className="min-w-0">
          <h2 ref={heading} tabIndex={-1} className="text-lg font-extrabold wrap-break-word outline-none">
            {title}
          </h2>
          {under !== null && <p className="text-xs text-graphite">{under}</p>}
        </div>
        {wanted && <Button onClick={onClose}>Close</Button>}
      </header>
      {children}
    </section>
  );
}

function Changed({ stored }: { stored: StoredCondition }) {
  return (
    <>
      {stored.isDefault && 'Default of the workshop · '}
      {stored.archived && 'In the archive · '}
      changed <Moment at={stored.updatedAt} /> by {stored.updatedBy.name}
    </>
  );
}
