import { PageHeading } from '../../../components/index.ts';
import { KeptPanel } from '../../../components/records/kept-panel.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useMay } from '../../../lib/session/session.ts';
import { productsApi } from '../api/products.ts';
import { moaOf, rateRange } from '../words.ts';

/** The products at hand, each with what its label says. */
export function ShelfPage() {
  const { id: farmId } = useFarm();
  const may = useMay();
  return (
    <>
      <PageHeading title="Shelf" over="Products and their labels" />
      <KeptPanel
        title="Products"
        api={productsApi}
        createTo={may('create', 'product') ? paths.shelf.create(farmId) : null}
        createLabel="Add a product"
        nothing="The shelf is empty. Take a jug in your hand and copy its label in: a plan is judged against it."
        row={(product) => ({
          id: product.id,
          name: product.name,
          to: paths.shelf.one(farmId, product.id),
          about: [rateRange(product), moaOf(product), product.epaRegistrationNumber && `EPA ${product.epaRegistrationNumber}`].filter(Boolean).join(' · '),
          mark: product.isExample ? <span className="rounded-full border px-3 py-1 text-sm">Example</span> : undefined,
        })}
      />
    </>
  );
}
