import { memo } from 'react';
import { formatLength, type Units } from '#client/app/units.ts';
import { checksumText, TitleGrid, type TitleCell } from '#client/drawing/title-block.tsx';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { type Plan } from '#geometry/cutting/plan.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';

/** What the title block of a cut sheet says (fields of ISO 7200). */
export interface PlanIdentity {
  readonly title: string;
  /** "3", or "draft on 3" for unsaved work. */
  readonly version: string;
  readonly status: VersionStatus;
  /** Section and version at the ends: "Heron outer v3". */
  readonly root: string;
  readonly tip: string;
  readonly author: string;
  /** ISO 8601; the date of it is shown. */
  readonly date: string;
  /** SHA-256 of the version; null for a draft, which has none. */
  readonly checksum: string | null;
  /** Typed from paper to find the sheet again; null for a draft. */
  readonly shortCode: string | null;
  /** Legal owner: the workshop. */
  readonly owner: string;
}

interface PlanTitleBlockProps {
  readonly layout: SheetLayout;
  readonly identity: PlanIdentity;
  readonly plan: Plan;
  readonly scale: string;
  readonly units: Units;
}

/** The title block at the lower right of a cut sheet. */
export const PlanTitleBlock = memo(function PlanTitleBlock(props: PlanTitleBlockProps) {
  const { layout, identity, plan, scale, units } = props;
  const cells = layout.compact ? compactCells(identity, scale) : wideCells(identity, plan, scale, units);
  return <TitleGrid layout={layout} cells={cells} />;
});

function wideCells(of: PlanIdentity, plan: Plan, scale: string, units: Units): TitleCell[] {
  const { root, tip, spanMm } = plan.panel;
  const length = (mm: number) => formatLength(mm, units, 1);
  return [
    { label: 'Title', text: of.title, from: 0, width: 0.52, row: 0, size: 16 },
    { label: 'Version', text: of.version, from: 0.52, width: 0.22, row: 0 },
    { label: 'Status', text: of.status, from: 0.74, width: 0.26, row: 0 },
    { label: 'Root and tip', text: sections(of), from: 0, width: 0.36, row: 1 },
    {
      label: 'Chords, span',
      text: `${length(root.chordMm).split(' ')[0] ?? ''} / ${length(tip.chordMm).split(' ')[0] ?? ''} / ${length(spanMm)}`,
      from: 0.36,
      width: 0.38,
      row: 1,
    },
    { label: 'Scale of the faces', text: scale, from: 0.74, width: 0.26, row: 1 },
    { label: 'Drawn', text: of.author, from: 0, width: 0.24, row: 2 },
    { label: 'Date', text: of.date.slice(0, 10), from: 0.24, width: 0.2, row: 2 },
    { label: 'Plan SHA-256', text: checksumText(of.checksum), from: 0.44, width: 0.3, row: 2 },
    { label: 'Owner', text: of.owner, from: 0.74, width: 0.26, row: 2 },
  ];
}

function sections({ root, tip }: PlanIdentity): string {
  return root === tip ? root : `${root}, ${tip}`;
}

function compactCells(of: PlanIdentity, scale: string): TitleCell[] {
  return [
    { label: 'Title', text: of.title, from: 0, width: 0.6, row: 0, size: 14 },
    { label: 'Version', text: of.version, from: 0.6, width: 0.4, row: 0 },
    { label: 'Root and tip', text: sections(of), from: 0, width: 0.6, row: 1 },
    { label: 'Status', text: of.status, from: 0.6, width: 0.4, row: 1 },
    { label: 'Drawn', text: of.author, from: 0, width: 0.36, row: 2 },
    { label: 'Faces', text: scale, from: 0.36, width: 0.26, row: 2 },
    { label: 'Date', text: of.date.slice(0, 10), from: 0.62, width: 0.38, row: 2 },
  ];
}
