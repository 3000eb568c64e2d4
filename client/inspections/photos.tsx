import { useRef } from 'react';
import { type Inspection } from '#server/contracts/cutting-list.ts';
import { photoUrl, useAddPhoto } from '#client/api/cutting-list.ts';
import { useMay } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';

/** Photographs of the part. Their metadata, such as the place where they were taken, does not stay in them. */
export function Photos({ inspection }: { readonly inspection: Inspection }) {
  const mayAdd = useMay('inspections.write');
  const input = useRef<HTMLInputElement>(null);
  const add = useAddPhoto(inspection.id);
  const { photos } = inspection;
  return (
    <section aria-label="Photographs" className="flex flex-col gap-3">
      {photos.length > 0 && (
        <ul className="flex flex-wrap gap-3">
          {photos.map(({ id, width, height }, i) => (
            <li key={id}>
              <a href={photoUrl(id)} target="_blank" rel="noreferrer">
                <img
                  src={photoUrl(id)}
                  width={width}
                  height={height}
                  loading="lazy"
                  alt={`Photograph ${String(i + 1)} of the part`}
                  className="h-40 w-auto border border-rule"
                />
              </a>
            </li>
          ))}
        </ul>
      )}
      {mayAdd && (
        <div className="flex flex-wrap items-center gap-4">
          <input
            ref={input}
            type="file"
            hidden
            accept="image/jpeg,image/png,image/webp"
            aria-label="Photograph of the part"
            onChange={(event) => {
              const [file] = event.target.files ?? [];
              if (file) add.mutate(file);
              event.target.value = '';
            }}
          />
          <Button size="large" busy={add.isPending} onClick={() => input.current?.click()}>
            {add.isPending ? 'Sending…' : 'Add a photograph…'}
          </Button>
          <p className="text-xs text-graphite">
            JPEG, PNG or WebP up to 12 MB; place and camera data are removed.
          </p>
        </div>
      )}
      {add.isError && <Notice tone="error">{sentenceOf(add.error)} The photograph was not added.</Notice>}
    </section>
  );
}
