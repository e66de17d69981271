import type { LumpedSpec } from './specs.ts'
import type { ThermalSystem } from './thermal-system.ts'

/**
 * One well-mixed body as a system of one node. Boundary group: `inside`.
 *
 * @throws RangeError for a capacity or conductance that is not positive
 */
export function lumpedSystem(spec: LumpedSpec): ThermalSystem {
  if (!(spec.capacity_JK > 0))
    throw new RangeError(`capacity_JK must be more than 0, got ${spec.capacity_JK}`)
  if (!(spec.conductance_WK > 0))
    throw new RangeError(`conductance_WK must be more than 0, got ${spec.conductance_WK}`)
  return {
    capacity_JK: Float64Array.of(spec.capacity_JK),
    conductance_WK: { size: 1, halfWidth: 0, data: Float64Array.of(spec.conductance_WK) },
    boundaries: [
      { name: 'inside', node: Int32Array.of(0), conductance_WK: Float64Array.of(spec.conductance_WK) },
    ],
    probes: [],
  }
}
