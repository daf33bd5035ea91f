import { useParams } from 'react-router-dom';
import { RecordEditor } from '../../../components/records/record-editor.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { productsApi } from '../api/products.ts';
import { ProductForm } from '../components/product-form.tsx';

export function NewProductPage() {
  const { id: farmId } = useFarm();
  const save = productsApi.useSave(farmId, null);
  return (
    <RecordEditor resource="product" title="New product" stored={null} save={save.mutateAsync} after={(item) => paths.shelf.one(farmId, item.id)} cancelTo={paths.shelf.list(farmId)}>
      {(part) => <ProductForm {...part} />}
    </RecordEditor>
  );
}

export function EditProductPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const product = productsApi.useOne(farmId, id);
  const save = productsApi.useSave(farmId, id);
  const here = paths.shelf.one(farmId, id);
  return (
    <RecordEditor resource="product" title={`Edit ${product.name}`} stored={product} save={save.mutateAsync} after={() => here} cancelTo={here}>
      {(part) => <ProductForm {...part} />}
    </RecordEditor>
  );
}
