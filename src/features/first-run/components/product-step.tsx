import { useState } from 'react';
import type { Product } from '../../../../shared/api/plans.ts';
import { Button } from '../../../components/index.ts';
import { productsApi } from '../../shelf/api/products.ts';
import { starters } from '../starters.ts';

/** An invented product to begin with: its label figures are replaced on the shelf. */
export function ProductStep({ farmId, done }: { farmId: string; done: (product: Product) => void }) {
  const save = productsApi.useSave(farmId, null);
  const [problem, setProblem] = useState<string | null>(null);

  async function choose(body: (typeof starters)[number]) {
    setProblem(null);
    try {
      done(await save.mutateAsync({ body, version: undefined }));
    } catch (error) {
      setProblem(error instanceof Error ? error.message : 'That did not work. Try again.');
    }
  }

  return (
    <div className="space-y-4">
      <p>Choose what comes nearest to begin with. Both are invented examples: before you spray, put the label in your hand on the shelf in its place.</p>
      <div className="grid gap-3 sm:grid-cols-2">
        {starters.map((starter) => (
          <Button key={starter.name} variant="quiet" busy={save.isPending} onClick={() => void choose(starter)}>
            {starter.name}
          </Button>
        ))}
      </div>
      {problem && <p role="alert">{problem}</p>}
    </div>
  );
}
