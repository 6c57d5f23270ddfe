import type { MechanismName } from './crystal.ts';

/**
 * Why a conductivity is refused:
 * - `no-resistive-rate`: a branch has no scattering that resists the heat flow;
 * - `long-waves-unscattered`: the remaining scattering falls so fast towards long waves that the integral diverges;
 * - `beyond-double`: the result is too large (or too small) for a double-precision number.
 */
export type UnboundedReason = 'no-resistive-rate' | 'long-waves-unscattered' | 'beyond-double';

/** The estimate has no finite value for these inputs. The message says which scattering is missing and what to do. */
export class UnboundedConductivityError extends RangeError {
  readonly reason: UnboundedReason;
  /** Mechanisms that were switched on, in spite of which the conductivity is unbounded. */
  readonly mechanisms: readonly MechanismName[];

  constructor(reason: UnboundedReason, mechanisms: readonly MechanismName[], message: string) {
    super(message);
    this.name = 'UnboundedConductivityError';
    this.reason = reason;
    this.mechanisms = mechanisms;
  }
}
