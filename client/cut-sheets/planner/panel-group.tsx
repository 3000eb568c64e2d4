import { EndHeads, Group, PairRow, QuantityRow } from './rows.tsx';
import { SectionFields } from './section-fields.tsx';
import { type PlanSources } from './use-plan-sources.ts';

/** The panel between its ends: sections, chords and how the tip lies. */
export function PanelGroup({ sources }: { sources: PlanSources }) {
  return (
    <Group title="Panel">
      <SectionFields sources={sources} />
      <EndHeads />
      <PairRow label="Chord" as="length" root="panel.root.chordMm" tip="panel.tip.chordMm" />
      <QuantityRow label="Span" path="panel.spanMm" as="length" />
      <QuantityRow label="Sweep of the nose" path="panel.sweepMm" as="length" />
      <QuantityRow label="Washout" path="panel.washoutDeg" as="angle" decimals={2} />
      <QuantityRow label="Washout about" path="panel.washoutStation" as="station" end="tip" />
      <QuantityRow label="Tip raised by" path="panel.verticalOffsetMm" as="length" />
    </Group>
  );
}

/** Skins and kerf: what lies between the true contour and the wire. */
export function SkinGroup({
  measured,
}: {
  /** Where the kerf comes from; empty until that is known, null where nothing has one. */
  readonly measured: string | null;
}) {
  return (
    <Group title="Skin and kerf">
      <QuantityRow label="Skin, upper" path="allowances.upperMm" as="length" decimals={2} />
      <QuantityRow label="Skin, lower" path="allowances.lowerMm" as="length" decimals={2} />
      <EndHeads />
      <PairRow label="Kerf" as="length" decimals={2} root="kerfMm.root" tip="kerfMm.tip" />
      {measured !== null && <p className="min-h-9 text-xs text-graphite">{measured}</p>}
    </Group>
  );
}
