import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery } from '@tanstack/react-query';
import { type ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { type z } from 'zod';
import { releaseSchema, type SectionVersion, withdrawSchema } from '#server/contracts/sections.ts';
import { fieldErrors } from '#client/api/request.ts';
import { sectionQuery, useReleaseVersion, useWithdrawVersion } from '#client/api/sections.ts';
import { useAnnounce } from '#client/ui/announcer.tsx';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextAreaField } from '#client/ui/text-field.tsx';

interface StatusDialogProps {
  readonly version: SectionVersion;
  readonly onClose: () => void;
}

/** Puts a version in force; says which one it takes the place of. */
export function ReleaseDialog({ version, onClose }: StatusDialogProps) {
  const release = useReleaseVersion(version.sectionId);
  const form = useForm<z.input<typeof releaseSchema>, unknown, z.output<typeof releaseSchema>>({
    resolver: zodResolver(releaseSchema),
    defaultValues: { reason: '' },
  });
  const done = useDone(`Version ${version.number} is released.`, onClose);
  const { error, isPending } = release;
  return (
    <Dialog title={`Release version ${version.number}`} onClose={onClose}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={form.handleSubmit(({ reason }) =>
          release.mutate({ number: version.number, reason }, { onSuccess: done }),
        )}
      >
        <p>
          {version.sectionName}, {version.description}. Its files may be cut as soon as it is released.{' '}
          <Succession version={version} />
        </p>
        <TextAreaField
          label="Why it is good to cut (optional)"
          maxLength={500}
          error={messageOf(form.formState.errors.reason?.message, error)}
          {...form.register('reason')}
        />
        <Foot error={error} onClose={onClose}>
          <Button type="submit" variant="primary" busy={isPending}>
            Release version {version.number}
          </Button>
        </Foot>
      </form>
    </Dialog>
  );
}

/** Takes a released version out of force; the reason is what the people at the machines will read. */
export function WithdrawDialog({ version, onClose }: StatusDialogProps) {
  const withdraw = useWithdrawVersion(version.sectionId);
  const form = useForm<z.input<typeof withdrawSchema>, unknown, z.output<typeof withdrawSchema>>({
    resolver: zodResolver(withdrawSchema),
    defaultValues: { reason: '' },
  });
  const done = useDone(`Version ${version.number} is withdrawn.`, onClose);
  const { error, isPending } = withdraw;
  return (
    <Dialog title={`Withdraw version ${version.number}`} onClose={onClose}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={form.handleSubmit(({ reason }) =>
          withdraw.mutate({ number: version.number, reason }, { onSuccess: done }),
        )}
      >
        <p>
          {version.sectionName}, {version.description}. After this no version of the section is in force until
          another is released. Files already taken are not called back: tell the people at the machines.
        </p>
        <TextAreaField
          label="Why it is withdrawn"
          required
          maxLength={500}
          error={messageOf(form.formState.errors.reason?.message, error)}
          {...form.register('reason')}
        />
        <Foot error={error} onClose={onClose}>
          <Button type="submit" variant="danger" busy={isPending}>
            Withdraw version {version.number}
          </Button>
        </Foot>
      </form>
    </Dialog>
  );
}

function Succession({ version }: { readonly version: SectionVersion }) {
  const { data } = useQuery(sectionQuery(version.sectionId));
  if (!data) return null;
  if (data.releasedNumber === null) return <>No version of this section is in force now.</>;
  return <>Version {data.releasedNumber}, in force now, will be superseded.</>;
}

interface FootProps {
  readonly error: unknown;
  readonly onClose: () => void;
  readonly children: ReactNode;
}

function Foot({ error, onClose, children }: FootProps) {
  return (
    <>
      {error !== null && (
        <Notice tone="error">{sentenceOf(error)} Nothing was changed; what you typed is kept.</Notice>
      )}
      <div className="flex flex-wrap justify-end gap-2">
        <Button onClick={onClose}>Cancel</Button>
        {children}
      </div>
    </>
  );
}

function useDone(sentence: string, onClose: () => void): () => void {
  const announce = useAnnounce();
  return () => {
    announce(sentence);
    onClose();
  };
}

function messageOf(typed: string | undefined, refusal: unknown): string | undefined {
  return typed ?? fieldErrors(refusal).get('reason');
}
