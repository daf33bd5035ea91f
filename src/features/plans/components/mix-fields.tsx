import { useFieldArray, useWatch } from 'react-hook-form';
import type { Product } from '../../../../shared/api/plans.ts';
import { Button } from '../../../components/index.ts';
import { ChoiceField, NumberField } from '../../../lib/forms/fields.tsx';
import type { TypedForm } from '../../../lib/forms/use-typed-form.ts';
import { rateUnitWords } from '../../../lib/rate-words.ts';
import type { PlanBody } from './plan-form.tsx';

const productsMax = 6;

/** One row per product of the tank mix, each with its rate in the unit of its own label. */
export function MixFields({ form, products }: { form: TypedForm<PlanBody>; products: Product[] }) {
  const { control } = form.form;
  const { fields, append, remove } = useFieldArray({ control, name: 'products' });
  const chosen = useWatch({ control, name: 'products' });
  const allProblem = form.bind('products').problem;

  return (
    <>
      {fields.map((field, index) => {
        const product = products.find(({ id }) => id === chosen[index]?.productId);
        const labelRates = product ? `The label allows ${product.rateMin} to ${product.rateMax} ${rateUnitWords[product.rateUnit]}.` : undefined;
        return (
          <div key={field.id} className="col-span-full grid gap-x-8 gap-y-3 sm:grid-cols-2">
            <ChoiceField {...form.bind(`products.${index}.productId`)} label={`Product ${index + 1}`} choices={[['', 'Choose a product'], ...products.map(({ id, name }): [string, string] => [id, name])]} />
            <NumberField {...form.bind(`products.${index}.rate`)} label={`Rate of product ${index + 1}`} unit={product ? rateUnitWords[product.rateUnit] : ''} hint={labelRates} required />
            {fields.length > 1 && (
              <Button variant="quiet" onClick={() => remove(index)}>
                Leave out product {index + 1}
              </Button>
            )}
          </div>
        );
      })}
      {allProblem && <p className="col-span-full font-semibold text-rose-deep">{allProblem}</p>}
      {fields.length < productsMax && (
        <div className="col-span-full">
          <Button variant="quiet" onClick={() => append({ productId: '', rate: '' })}>
            Add a product to the mix
          </Button>
        </div>
      )}
    </>
  );
}
