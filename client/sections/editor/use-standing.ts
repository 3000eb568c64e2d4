import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useRef } from 'react';
import { describeShape, type Shape } from '#geometry/shapes/shape.ts';
import { type Section, type SectionVersion } from '#server/contracts/sections.ts';
import { versionQuery } from '#client/api/sections.ts';
import { useMe } from '#client/app/session.tsx';
import { type TitleBlockFields } from '#client/drawing/title-block.tsx';
import { type DraftKeeper } from './draft-keeper.ts';
import { type Present, sameShape } from './present.ts';

/** The version that the work stands on, with its present status; the one known before until a newer has arrived. */
export function useStandingVersion(sectionId: string, number: number, known: SectionVersion): SectionVersion {
  const { data } = useQuery(versionQuery(sectionId, number));
  return data ?? known;
}

/** The shape of the version to draw behind the section. */
export function useGhost(sectionId: string, number: number | null): Shape | null {
  const { data } = useQuery({ ...versionQuery(sectionId, number ?? 1), enabled: number !== null });
  return number === null ? null : (data?.shape ?? null);
}

/** The title block: of the saved version, or of unsaved work on it. */
export function useTitle(
  section: Section,
  shape: Shape,
  version: SectionVersion,
  dirty: boolean,
): TitleBlockFields {
  const me = useMe();
  return useMemo(
    () => ({
      title: section.name,
      designation: describeShape(shape),
      version: dirty ? `draft on ${version.number}` : String(version.number),
      status: dirty ? 'draft' : version.status,
      author: dirty ? me.name : version.author.name,
      date: dirty ? new Date().toISOString() : version.createdAt,
      checksum: dirty ? null : version.checksum,
      owner: me.workshop.name,
    }),
    [section.name, shape, version, dirty, me],
  );
}

interface Kept {
  readonly present: Present;
  readonly basedOn: number;
}

/**
 * Hands every change to the keeper. What was just saved as a version is no longer a draft and is not kept again.
 * @param kept What the server has already, or null when the work came from this browser.
 */
export function useKeeping(
  keeper: DraftKeeper,
  present: Present,
  basedOn: number,
  dirty: boolean,
  kept: Kept | null,
): void {
  const last = useRef(kept);
  useEffect(() => {
    const before = last.current;
    last.current = { present, basedOn };
    const same =
      before !== null &&
      before.present.chordMm === present.chordMm &&
      sameShape(before.present.shape, present.shape);
    if (same && (before.basedOn === basedOn || !dirty)) return;
    keeper.change({ basedOn, shape: present.shape, chordMm: present.chordMm });
  }, [keeper, present, basedOn, dirty]);
}
