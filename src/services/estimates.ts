import type { Actor } from '#src/auth/actor.ts';
import type { DatabaseHandle, Transaction } from '#src/db/client.ts';
import { listTransitions } from '#src/db/queries/crystal-values.ts';
import { findMaterialBySlug } from '#src/db/queries/materials.ts';
import type { MaterialRecord, ValueRecord } from '#src/db/queries/records.ts';
import { AppError } from '#src/lib/errors.ts';
import type { FieldError } from '#src/lib/errors.ts';
import { effectiveLengthM, mechanismNames } from '#src/physics/index.ts';
import { defaultBoundaryLengthM } from '#src/schemas/estimate.ts';
import type {
  EstimateParameterName,
  EstimateRequest,
  EstimateResponse,
  EstimateSample,
} from '#src/schemas/estimate.ts';
import { listCautions } from '#src/services/estimate-cautions.ts';
import { resolveEstimatorInputs } from '#src/services/estimator-inputs.ts';
import type {
  CompleteParameters,
  MaterialFacts,
  ResolvedInputs,
  VelocityPair,
} from '#src/services/estimator-inputs.ts';
import { estimatePoints } from '#src/services/kinetic-estimate.ts';
import { loadMaterialFacts } from '#src/services/material-facts.ts';
import { expandTemperaturesK } from '#src/services/temperatures.ts';

/** κ(T) of a crystal by kinetic theory, as the HTTP contract has it. */

interface StoredMaterial {
  readonly record: MaterialRecord;
  readonly facts: MaterialFacts;
  readonly transitions: readonly ValueRecord[];
}

async function loadMaterial(tx: Transaction, slug: string): Promise<StoredMaterial> {
  const record = await findMaterialBySlug(tx, slug);
  const facts = record === null ? undefined : (await loadMaterialFacts(tx, [record])).get(record.id);
  if (record === null || facts === undefined) {
    const message = `There is no material ${JSON.stringify(slug)} in the store: take a slug of GET /api/v1/materials, such as "si".`;
    throw new AppError('NOT_FOUND', message, { fields: [{ path: 'material', message }] });
  }
  return { record, facts, transitions: await listTransitions(tx, record.id) };
}

function refuse(...fields: readonly FieldError[]): AppError {
  return new AppError('INVALID_INPUT', fields.map(({ message }) => message).join(' '), { fields });
}

/** L of the piece, m; null without a boundary. */
function effectiveLengthOf({ piece, boundary_length_m }: EstimateSample): number | null {
  if (piece !== undefined) return effectiveLengthM({ form: piece.form, sizeM: piece.size_m });
  return boundary_length_m === undefined ? defaultBoundaryLengthM : boundary_length_m;
}

/**
 * `parameters.mass_variance` takes the place of what composition and natural abundances give. Together with isotopes
 * other than natural a request would name two values for the same Γ, and neither is guessed to be the one meant.
 */
function requireOneIsotopeChoice({ parameters, sample }: EstimateRequest): void {
  if (parameters?.mass_variance === undefined || sample.isotopes === 'natural') return;
  throw refuse({
    path: 'parameters.mass_variance',
    message:
      'parameters.mass_variance and sample.isotopes both set the scattering by isotopes: leave out one of them (isotopes other than "natural" count only without mass_variance).',
  });
}

/** Abundances need a composition, which only a material of the store has. "pure" without one means Γ = 0. */
function requireComposition({ material, sample }: EstimateRequest): void {
  if (material !== undefined || typeof sample.isotopes === 'string') return;
  throw refuse({
    path: 'sample.isotopes',
    message:
      'Abundances need a composition: name a "material" of the store, or give the isotopes as parameters.mass_variance and parameters.mean_mass_u.',
  });
}

/** What cannot be derived from anything else. */
const neededParameters: readonly EstimateParameterName[] = [
  'cell_volume_A3',
  'atoms_per_cell',
  'mean_mass_u',
  'v_L_m_s',
  'v_T_m_s',
];

function requireParameters(
  resolved: ResolvedInputs,
  request: EstimateRequest,
): { parameters: CompleteParameters; average: VelocityPair } {
  const { parameters, average, obstacles } = resolved;
  if (parameters !== null && average !== null) return { parameters, average };
  if (request.material === undefined) {
    const missing = neededParameters.filter((name) => request.parameters?.[name] === undefined);
    if (missing.length > 0) {
      throw refuse(
        ...missing.map((name) => ({
          path: `parameters.${name}`,
          message: `parameters.${name} is missing: without a material of the store it must be given.`,
        })),
      );
    }
  }
  const detail = obstacles.map(({ message }) => message).join(' ');
  const fields = obstacles.flatMap(({ parameters: names, message }): readonly FieldError[] =>
    names.length === 0
      ? [{ path: 'material', message }]
      : names.map((name) => ({
          path: `parameters.${name}`,
          message: `${message} Or give parameters.${name}.`,
        })),
  );
  throw new AppError('UNPROCESSABLE', detail, { fields });
}

function totalMassVariance(isotopes: number, defects: number): number {
  const total = isotopes + defects;
  if (total <= 1) return total;
  throw refuse({
    path: 'sample.defect_mass_variance',
    message: `Γ adds up to ${total} (isotopes ${isotopes}, sample.defect_mass_variance ${defects}): it must be at most 1.`,
  });
}

/**
 * An estimate for a material of the store, for given parameters, or for a material with some of its numbers replaced.
 *
 * @throws AppError NOT_FOUND for a material that is not in the store, INVALID_INPUT for fields that cannot be used,
 * UNPROCESSABLE where the material lacks something or
 * physics gives no finite value.
 */
export async function estimateConductivity(
  db: DatabaseHandle,
  _actor: Actor,
  request: EstimateRequest,
): Promise<EstimateResponse> {
  requireOneIsotopeChoice(request);
  requireComposition(request);
  const { material: slug, sample } = request;
  const material = slug === undefined ? null : await db.run((tx) => loadMaterial(tx, slug));
  return answerEstimate(request, material, sample);
}

function answerEstimate(
  request: EstimateRequest,
  material: StoredMaterial | null,
  sample: EstimateSample,
): EstimateResponse {
  const resolved = resolveEstimatorInputs({
    material: material?.facts ?? null,
    given: request.parameters,
    isotopes: sample.isotopes,
  });
  const { parameters, average } = requireParameters(resolved, request);
  const isotopes = parameters.mass_variance;
  const defects = sample.defect_mass_variance;
  const total = totalMassVariance(isotopes, defects);
  const lengthM = effectiveLengthOf(sample);
  const model = request.model ?? resolved.recommendedModel;
  const points = estimatePoints({
    model,
    parameters,
    average,
    temperaturesK: expandTemperaturesK(request.temperatures_K),
    sample: {
      boundary: lengthM === null ? null : { effectiveLengthM: lengthM, specularity: sample.specularity },
      massVariance: total,
      porosity: sample.porosity,
      umklappScale: request.umklapp_scale,
      mechanisms: request.mechanisms ?? mechanismNames,
    },
  });
  return {
    material: material?.record.slug ?? null,
    model,
    umklapp_scale: request.umklapp_scale,
    effective_length_m: lengthM,
    mass_variance: { isotopes, defects, total },
    points,
    inputs: resolved.inputs,
    cautions: listCautions({
      material: material?.record ?? null,
      transitions: material?.transitions ?? [],
      points,
      inputs: resolved.inputs,
      atomicSpacingM: Math.cbrt(resolved.volumePerAtomM3 ?? 0),
      porosity: sample.porosity,
      defectMassVariance: defects,
    }),
  };
}
