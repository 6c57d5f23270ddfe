import type { Transaction } from '#src/db/client.ts';
import { listIsotopes, listPropertyValues } from '#src/db/queries/materials.ts';
import type { MaterialRecord } from '#src/db/queries/records.ts';
import type { MaterialFacts } from '#src/services/estimator-inputs.ts';

/** What estimates need to know of some materials, by material id; two queries for all of them. */
export async function loadMaterialFacts(
  tx: Transaction,
  materials: readonly MaterialRecord[],
): Promise<ReadonlyMap<string, MaterialFacts>> {
  const values = await listPropertyValues(
    tx,
    materials.map(({ id }) => id),
  );
  const elements = new Set(materials.flatMap(({ composition }) => composition.map(({ element }) => element)));
  const isotopes = await listIsotopes(tx, [...elements]);
  return new Map(
    materials.map((material) => [
      material.id,
      { ...material, values: values.get(material.id) ?? [], isotopes },
    ]),
  );
}
