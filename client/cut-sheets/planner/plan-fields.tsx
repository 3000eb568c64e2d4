import { type Ref } from 'react';
import { BlockGroup } from './block-group.tsx';
import { FeaturesGroup } from './features-group.tsx';
import { FoldedGroups } from './folded-groups.tsx';
import { PanelGroup, SkinGroup } from './panel-group.tsx';
import { PlannerProvider } from './planner-context.ts';
import { kerfFor, kerfWords } from './shop-choice.ts';
import { type usePlanner } from './use-planner.ts';

/** The form of the plan. */
export function PlanFields({
  ref,
  planner,
}: {
  ref: Ref<HTMLFormElement>;
  planner: ReturnType<typeof usePlanner>;
}) {
  const { fields, sources } = planner;
  const { values } = fields;
  const kerf = sources.kerfs && kerfFor(sources.kerfs, values['machineId'], values['materialId']);
  const asks = values['machineId'] !== null && values['materialId'] !== null;
  return (
    <PlannerProvider value={fields}>
      <form
        ref={ref}
        noValidate
        aria-label="Plan"
        onSubmit={(event) => {
          event.preventDefault();
          planner.askToSave();
        }}
        className="flex flex-col gap-5 max-lg:mx-auto max-lg:max-w-120"
      >
        <PanelGroup sources={sources} />
        <SkinGroup measured={asks ? (sources.kerfs ? kerfWords(kerf) : '') : null} />
        <FeaturesGroup />
        <BlockGroup sources={sources} />
        <FoldedGroups sources={sources} />
      </form>
    </PlannerProvider>
  );
}
