import { useMutation, useQueryClient } from '@tanstack/react-query';
import { addressOf, upload } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

export function useUploadLabel(farmId: string, id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (file: File) => upload(routes.products.uploadLabel, { params: { farmId, id }, file }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.kept(farmId, 'products') }),
  });
}

/** Where the browser reads the label file. */
export const labelAddress = (farmId: string, id: string) => addressOf(routes.products.readLabel, { farmId, id });
