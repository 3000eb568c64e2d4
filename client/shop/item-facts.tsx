import { type ShopItem } from '#client/api/shop.ts';
import { useUnits } from '#client/app/units.ts';
import { KindCautions } from './cautions.tsx';
import { FIELDS, type FieldSpec } from './fields.ts';
import { textOf } from './form-values.ts';

/** All settings of a machine or material, for those who may not change them. */
export function ItemFacts({ item }: { item: ShopItem }) {
  return (
    <>
      <KindCautions kind={item.settings.kind} />
      {FIELDS[item.settings.kind].map(({ title, fields }) => (
        <section key={title}>
          <h3 className="mb-1 border-b border-rule pb-1 text-xs font-semibold text-graphite uppercase">
            {title}
          </h3>
          <dl>
            {fields.map((spec) => (
              <Fact key={spec.path} spec={spec} item={item} />
            ))}
          </dl>
        </section>
      ))}
    </>
  );
}

function Fact({ spec, item }: { spec: FieldSpec; item: ShopItem }) {
  const text = textOf(spec, item.settings, useUnits());
  const shown = spec.as === 'choice' ? spec.options.find(({ value }) => value === text)?.label : text;
  return (
    <div className="flex justify-between gap-4 py-0.5">
      <dt className="text-graphite">{spec.label}</dt>
      <dd className="text-right font-semibold whitespace-pre-line">{shown === '' ? 'none' : shown}</dd>
    </div>
  );
}
