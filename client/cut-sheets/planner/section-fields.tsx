import { useInfiniteQuery } from '@tanstack/react-query';
import { type Section, type VersionStatus } from '#server/contracts/sections.ts';
import { sectionsQuery, versionsQuery } from '#client/api/sections.ts';
import { SelectField } from '#client/ui/select-field.tsx';
import { StatusGlyph } from '#client/ui/status-mark.tsx';
import { ENDS, type End } from '#geometry/cutting/plan.ts';
import { usePlannerFields } from './planner-context.ts';
import { withValue } from './plan-values.ts';
import { type EndSource, type PlanSources } from './use-plan-sources.ts';

/** Which version of which section stands at each end; released ones first. */
export function SectionFields({ sources }: { sources: PlanSources }) {
  const query = useInfiniteQuery(sectionsQuery({ sort: 'name', limit: 100 }));
  const sections = query.data?.pages.flatMap(({ items }) => items) ?? [];
  return ENDS.map((end) => <EndFields key={end} end={end} source={sources[end]} sections={sections} />);
}

interface EndFieldsProps {
  readonly end: End;
  readonly source: EndSource;
  readonly sections: readonly Section[];
}

function EndFields({ end, source, sections }: EndFieldsProps) {
  const { values, replace, setValue, enabled, errors } = usePlannerFields();
  const path = `panel.${end}`;
  const word = end === 'root' ? 'Root' : 'Tip';
  const choose = (sectionId: string) => {
    const section = sections.find(({ id }) => id === sectionId);
    if (!section) return;
    const number = section.releasedNumber ?? section.latest.number;
    replace(withValue(withValue(values, `${path}.sectionId`, sectionId), `${path}.versionNumber`, number));
  };
  const isLoose = source.status !== null && source.status !== 'released';
  return (
    <div>
      <div className="grid grid-cols-[3rem_minmax(0,1fr)] items-center gap-x-1.5 gap-y-1">
        <span aria-hidden="true" className="row-span-2 self-start pt-1.5">
          {word}
        </span>
        <SelectField
          label={`Section at the ${end}`}
          hideLabel
          name={`${path}.sectionId`}
          disabled={!enabled}
          options={sectionOptions(sections, source)}
          error={errors.get(`${path}.sectionId`)}
          value={source.sectionId}
          onChange={(event) => choose(event.target.value)}
          className="font-semibold"
        />
        <VersionField
          source={source}
          label={`Version at the ${end}`}
          name={`${path}.versionNumber`}
          disabled={!enabled}
          onChange={(number) => setValue(`${path}.versionNumber`, number)}
        />
      </div>
      {isLoose && (
        <p className="mt-1 ml-13.5 flex items-baseline gap-1.5 text-xs text-amber">
          <StatusGlyph status={source.status ?? 'draft'} />
          {`This version is ${source.status === 'draft' ? 'not released' : source.status}: the sheet cannot be released from it.`}
        </p>
      )}
    </div>
  );
}

function sectionOptions(sections: readonly Section[], { sectionId, name }: EndSource) {
  const known = sections.some(({ id }) => id === sectionId);
  const option = ({ id, name: called, releasedNumber }: Section) => ({
    value: id,
    label: releasedNumber === null ? `${called} (none released)` : called,
  });
  return [
    ...(known ? [] : [{ value: sectionId, label: name ?? '…' }]),
    ...sections.filter(({ releasedNumber }) => releasedNumber !== null).map(option),
    ...sections.filter(({ releasedNumber }) => releasedNumber === null).map(option),
  ];
}

interface VersionFieldProps {
  readonly source: EndSource;
  readonly label: string;
  readonly name: string;
  readonly disabled: boolean;
  readonly onChange: (number: number) => void;
}

function VersionField({ source, label, name, disabled, onChange }: VersionFieldProps) {
  const { sectionId, versionNumber, status } = source;
  const query = useInfiniteQuery({ ...versionsQuery(sectionId), enabled: sectionId !== '' });
  const versions = query.data?.pages.flatMap(({ items }) => items) ?? [];
  const option = (number: number, of: VersionStatus | null) => ({
    value: String(number),
    label: of === null ? `version ${number}` : `version ${number}, ${of}`,
  });
  const known = versions.some(({ number }) => number === versionNumber);
  return (
    <SelectField
      label={label}
      hideLabel
      name={name}
      disabled={disabled}
      options={[
        ...(known ? [] : [option(versionNumber, status)]),
        ...versions.map((version) => option(version.number, version.status)),
      ]}
      value={String(versionNumber)}
      onChange={(event) => onChange(Number(event.target.value))}
    />
  );
}
