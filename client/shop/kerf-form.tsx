import { useWatch } from 'react-hook-form';
import { Button } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';
import { KerfCaution, KindCautions } from './cautions.tsx';
import { KerfStrip } from './kerf-strip.tsx';
import { kerfRange, textsOfKerf, today } from './kerf-values.ts';
import { formatShopQuantity } from './quantities.ts';
import { StandingNotice } from './standing-notice.tsx';
import { useKerfForm } from './use-kerf-form.ts';
import { useUnsaved } from './use-unsaved.tsx';

const ORIGINS = [
  { value: 'measured', label: 'measured on a test strip' },
  { value: 'default', label: 'default, not measured' },
];

/** The kerf of one machine in one material. */
export function KerfForm(props: { machine: Machine; material: Material; kerf: Kerf | null }) {
  const { machine, material, kerf } = props;
  const { form, units, byHand, standing, saved, busy, save, saveMine, takeTheirs } = useKerfForm(
    machine,
    material,
    kerf,
  );
  const { question } = useUnsaved(form.formState.isDirty);
  const { errors } = form.formState;
  const takeMeasured = (kerfMm: number) => {
    const touched = { shouldDirty: true, shouldValidate: true };
    form.setValue('kerfMm', formatShopQuantity(kerfMm, 'length', units, 2), touched);
    form.setValue('origin', 'measured', touched);
    form.setValue('measuredOn', today(), touched);
  };
  return (
    <form
      noValidate
      onSubmit={(event) => void form.handleSubmit(save)(event)}
      className="flex flex-col gap-4"
    >
      <KerfCaution />
      <KerfStrip machine={machine} material={material} onKerf={takeMeasured} />
      <TextField
        label="Kerf"
        autoComplete="off"
        hint={`The whole width that is lost, both sides. ${kerfRange(units)}`}
        error={errors.kerfMm?.message}
        {...form.register('kerfMm')}
      />
      {!byHand && (
        <TextField
          label={material.settings.kind === 'foam' ? 'At a wire speed of' : 'At a feed of'}
          autoComplete="off"
          hint="A slower wire melts more: the kerf holds for this speed."
          error={errors.speedMmMin?.message}
          {...form.register('speedMmMin')}
        />
      )}
      <OriginFields form={form} />
      <KindCautions kind={machine.settings.kind} />
      {standing && (
        <StandingNotice
          who={standing.by.name}
          at={standing.updatedAt}
          differences={[wordsOf(standing, units)]}
          onTakeTheirs={takeTheirs}
          onSaveMine={() => void form.handleSubmit(saveMine)()}
          busy={busy}
        />
      )}
      {errors.root?.message !== undefined && <Notice tone="error">{errors.root.message}</Notice>}
      {saved && !form.formState.isDirty && <Notice tone="good">Saved.</Notice>}
      <Button variant="primary" type="submit" busy={busy} className="self-start">
        Save the kerf
      </Button>
      {question}
    </form>
  );
}

/** Whether somebody measured it, and when. */
function OriginFields({ form }: { form: ReturnType<typeof useKerfForm>['form'] }) {
  const origin = useWatch({ control: form.control, name: 'origin' });
  return (
    <>
      <SelectField label="Where it comes from" options={ORIGINS} {...form.register('origin')} />
      {origin === 'measured' && (
        <TextField
          label="Measured on"
          type="date"
          max={today()}
          error={form.formState.errors.measuredOn?.message}
          {...form.register('measuredOn')}
        />
      )}
    </>
  );
}

function wordsOf(kerf: Kerf, units: Parameters<typeof textsOfKerf>[2]): string {
  const { kerfMm, speedMmMin } = textsOfKerf(kerf, null, units);
  const origin = kerf.measuredOn === null ? 'default, not measured' : `measured on ${kerf.measuredOn}`;
  return [kerfMm, ...(speedMmMin === '' ? [] : [`at ${speedMmMin}`]), origin].join(', ');
}
