import { memo, useCallback } from 'react';
import { useNavigate } from 'react-router';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type SectionVersion } from '#server/contracts/sections.ts';
import { VersionStrip } from '#client/versions/version-strip.tsx';
import { type EditorAction } from './editor-state.ts';
import { type SheetSettings } from './sheet-settings.ts';

interface SectionVersionsProps {
  readonly sectionId: string;
  readonly shape: Shape;
  readonly dirty: boolean;
  readonly basedOn: number;
  readonly ghost: number | null;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
  readonly dispatch: (action: EditorAction) => void;
}

/** The versions below the sheet; left alone while a handle is dragged. */
export const SectionVersions = memo(function SectionVersions(props: SectionVersionsProps) {
  const { sectionId, shape, dirty, basedOn, ghost, onSettings, dispatch } = props;
  const navigate = useNavigate();
  const showGhost = useCallback(
    (number: number | null) => {
      onSettings({ ghost: number });
    },
    [onSettings],
  );
  const open = useCallback(
    (number: number) => {
      void navigate(`/sections/${sectionId}/versions/${number}`);
    },
    [navigate, sectionId],
  );
  const restore = useCallback(
    (version: SectionVersion) => {
      dispatch({
        type: 'set-shape',
        shape: version.shape,
        notice: { code: 'restored', number: version.number },
      });
    },
    [dispatch],
  );
  return (
    <VersionStrip
      sectionId={sectionId}
      draftShape={dirty ? shape : null}
      basedOn={basedOn}
      ghost={ghost}
      onGhost={showGhost}
      onOpen={open}
      onRestore={restore}
    />
  );
});
