import { and, asc, eq, gt, gte, inArray, lte, or, sql } from 'drizzle-orm';
import type { SQL } from 'drizzle-orm';
import type { Transaction } from '#src/db/client.ts';
import type { CaveatRecord, IsotopeRecord, MaterialRecord, ValueRecord } from '#src/db/queries/records.ts';
import { citedSourceColumns, toSourceReference } from '#src/db/queries/sources.ts';
import { caveat, isotope, material, propertyValue, source } from '#src/db/schema/index.ts';
import type { PropertyName } from '#src/db/schema/properties.ts';

/** Reading materials: columns in, records out, no rules. */

const materialColumns = {
  id: material.id,
  slug: material.slug,
  name: material.name,
  formula: material.formula,
  aliases: material.aliases,
  composition: material.composition,
  structure: material.structure,
  spaceGroup: material.spaceGroup,
  spaceGroupNumber: material.spaceGroupNumber,
  class: material.class,
  atomsPerCell: material.atomsPerCell,
  hazards: material.hazards,
  note: material.note,
  revision: material.revision,
};

export async function findMaterialBySlug(tx: Transaction, slug: string): Promise<MaterialRecord | null> {
  const [row] = await tx.select(materialColumns).from(material).where(eq(material.slug, slug)).limit(1);
  return row ?? null;
}

export interface MaterialFilter {
  readonly class?: string | undefined;
  readonly structure?: string | undefined;
  readonly element?: string | undefined;
  readonly thetaMinK?: number | undefined;
  readonly thetaMaxK?: number | undefined;
  /** Of the longitudinal velocity that lists show: the average one, else that of the branch. */
  readonly velocityMinMPerS?: number | undefined;
  readonly velocityMaxMPerS?: number | undefined;
}

/** Materials whose preferred value of a property (the first of the kinds that it has) lies between two bounds. */
function hasPreferredValueBetween(
  property: PropertyName,
  min: number | undefined,
  max: number | undefined,
): SQL | undefined {
  if (min === undefined && max === undefined) return undefined;
  const bounds = and(
    min === undefined ? undefined : gte(sql`preferred.value`, min),
    max === undefined ? undefined : lte(sql`preferred.value`, max),
  );
  return sql`exists (
    select from (
      select ${propertyValue.value} as value from ${propertyValue}
      where ${propertyValue.materialId} = ${material.id} and ${propertyValue.property} = ${property}
        and ${propertyValue.isPreferred}
      order by ${propertyValue.kind} = 'branch' limit 1
    ) as preferred where ${bounds}
  )`;
}

function matchesFilter(filter: MaterialFilter): SQL | undefined {
  return and(
    filter.class === undefined ? undefined : eq(material.class, filter.class),
    filter.structure === undefined ? undefined : eq(material.structure, filter.structure),
    filter.element === undefined
      ? undefined
      : sql`${material.composition} @> ${JSON.stringify([{ element: filter.element }])}::jsonb`,
    hasPreferredValueBetween('debye_temperature', filter.thetaMinK, filter.thetaMaxK),
    hasPreferredValueBetween('sound_velocity_longitudinal', filter.velocityMinMPerS, filter.velocityMaxMPerS),
  );
}

/** Names sort without regard to case, the same way on every server. */
const nameKey = sql<string>`lower(${material.name}) collate "C"`;

/** Materials in name order, after the row that a cursor names. */
export async function listMaterialsByName(
  tx: Transaction,
  query: {
    readonly filter: MaterialFilter;
    readonly after: { readonly nameKey: string; readonly slug: string } | null;
    readonly limit: number;
  },
): Promise<readonly (MaterialRecord & { readonly nameKey: string })[]> {
  const { filter, after, limit } = query;
  const isLater =
    after === null
      ? undefined
      : or(
          sql`${nameKey} > ${after.nameKey}`,
          and(sql`${nameKey} = ${after.nameKey}`, gt(sql`${material.slug} collate "C"`, after.slug)),
        );
  return tx
    .select({ ...materialColumns, nameKey })
    .from(material)
    .where(and(matchesFilter(filter), isLater))
    .orderBy(asc(nameKey), asc(sql`${material.slug} collate "C"`))
    .limit(limit);
}

/** So many candidates at most are ranked: more than a reader looks at, few enough to rank in a few milliseconds. */
export const searchCandidateMax = 500;
/** Word similarity from which a misspelling counts as meant; half of the words' trigrams are usual for one slip. */
const similarityThreshold = '0.3';

/**
 * Candidates for a search: whose name, formula, slug or aliases resemble the words, best first, or whose elements are
 * exactly the given ones.
 */
export async function proposeMaterials(
  tx: Transaction,
  query: {
    readonly words: string;
    readonly elements: readonly string[] | null;
    readonly filter: MaterialFilter;
  },
): Promise<readonly MaterialRecord[]> {
  const words = query.words.toLowerCase();
  await tx.execute(sql`select set_config('pg_trgm.word_similarity_threshold', ${similarityThreshold}, true)`);
  const { elements } = query;
  const hasTheseElements =
    elements === null
      ? undefined
      : and(
          sql`${material.composition} @> ${JSON.stringify(elements.map((element) => ({ element })))}::jsonb`,
          sql`jsonb_array_length(${material.composition}) = ${elements.length}`,
        );
  return tx
    .select(materialColumns)
    .from(material)
    .where(
      and(
        or(
          sql`${words} <% ${material.searchText}`,
          sql`${material.searchText} like ${`%${escapeLike(words)}%`}`,
          hasTheseElements,
        ),
        matchesFilter(query.filter),
      ),
    )
    .orderBy(
      ...(hasTheseElements === undefined ? [] : [sql`(${hasTheseElements}) desc`]),
      sql`word_similarity(${words}, ${material.searchText}) desc`,
      sql`${material.slug} collate "C"`,
    )
    .limit(searchCandidateMax);
}

function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, '\\$&');
}

/** Stored property values of some materials, by material id. */
export async function listPropertyValues(
  tx: Transaction,
  materialIds: readonly string[],
): Promise<ReadonlyMap<string, readonly ValueRecord[]>> {
  if (materialIds.length === 0) return new Map();
  const rows = await tx
    .select({
      materialId: propertyValue.materialId,
      property: propertyValue.property,
      kind: propertyValue.kind,
      valueSet: propertyValue.valueSet,
      value: propertyValue.value,
      unit: propertyValue.unit,
      uncertainty: propertyValue.uncertainty,
      temperatureK: propertyValue.temperatureK,
      direction: propertyValue.direction,
      basis: propertyValue.basis,
      verification: propertyValue.verification,
      preferred: propertyValue.isPreferred,
      note: propertyValue.note,
      source: citedSourceColumns,
    })
    .from(propertyValue)
    .innerJoin(source, eq(source.key, propertyValue.sourceKey))
    .where(inArray(propertyValue.materialId, [...materialIds]))
    .orderBy(
      sql`${propertyValue.isPreferred} desc`,
      asc(propertyValue.property),
      asc(propertyValue.kind),
      asc(propertyValue.valueSet),
      asc(propertyValue.sourceKey),
      asc(propertyValue.value),
    );
  const records = rows.map(({ materialId, source: cited, ...row }) => ({
    materialId,
    record: { ...row, source: toSourceReference(cited) } satisfies ValueRecord,
  }));
  return groupByMaterial(records);
}

function groupByMaterial<Record>(
  rows: readonly { readonly materialId: string; readonly record: Record }[],
): ReadonlyMap<string, readonly Record[]> {
  const groups = new Map<string, Record[]>();
  for (const { materialId, record } of rows) {
    const group = groups.get(materialId);
    if (group === undefined) groups.set(materialId, [record]);
    else group.push(record);
  }
  return groups;
}

export async function listCaveats(tx: Transaction, materialId: string): Promise<readonly CaveatRecord[]> {
  const rows = await tx
    .select({ text: caveat.text, verification: caveat.verification, source: citedSourceColumns })
    .from(caveat)
    .innerJoin(source, eq(source.key, caveat.sourceKey))
    .where(eq(caveat.materialId, materialId))
    .orderBy(asc(caveat.text));
  return rows.map((row) => ({ ...row, source: toSourceReference(row.source) }));
}

/** Isotopes of some elements. */
export async function listIsotopes(
  tx: Transaction,
  elements: readonly string[],
): Promise<readonly IsotopeRecord[]> {
  if (elements.length === 0) return [];
  return tx
    .select({
      element: isotope.symbol,
      massNumber: isotope.massNumber,
      massU: isotope.massU,
      abundanceFraction: isotope.abundanceFraction,
    })
    .from(isotope)
    .where(inArray(isotope.symbol, [...elements]))
    .orderBy(asc(isotope.symbol), asc(isotope.massNumber));
}
