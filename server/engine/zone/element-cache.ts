import { layersSystem } from '../conduction/layers.ts'
import { lumpedSystem } from '../conduction/lumped.ts'
import { reduce } from '../conduction/reduce.ts'
import { sectionSystem, type SectionMesh } from '../conduction/section.ts'
import { undisturbedField } from '../conduction/field.ts'
import type { ElementSpec } from '../conduction/specs.ts'
import type { ReducedElement, ThermalSystem } from '../conduction/thermal-system.ts'

/** A spec turned into a system and its modes; the mesh for sections only. */
export interface CachedElement {
  readonly system: ThermalSystem
  readonly reduced: ReducedElement
  readonly mesh: SectionMesh | null
}

/** Elements by the text of their spec: what is built alike is reduced once. */
export type ElementCache = Map<string, CachedElement>

const QUARTER_YEAR_S = (365 * 86400) / 4

/**
 * The system, modes and mesh of a spec, from the cache or made now.
 *
 * @throws RangeError that begins with `name`
 */
export function cachedElement(spec: ElementSpec, name: string, cache: ElementCache): CachedElement {
  const key = JSON.stringify(spec)
  const known = cache.get(key)
  if (known) return known
  try {
    const made = build(spec)
    cache.set(key, made)
    return made
  } catch (error) {
    if (error instanceof RangeError) throw new RangeError(`${name}: ${error.message}`, { cause: error })
    throw error
  }
}

function build(spec: ElementSpec): CachedElement {
  if (spec.kind === 'layers') {
    const system = layersSystem(spec)
    return { system, reduced: reduce(system), mesh: null }
  }
  if (spec.kind === 'lumped') {
    const system = lumpedSystem(spec)
    return { system, reduced: reduce(system), mesh: null }
  }
  const { system, mesh } = sectionSystem(spec)
  // Both quadratures of the undisturbed yearly wave lie in the span, so that any month can be started from.
  const diffusivity_m2s = spec.soil.conductivity_WmK / spec.soil.volumetricHeat_Jm3K
  const wave = { mean_C: 0, amplitude_K: 1, coldest_s: 0, diffusivity_m2s }
  const extraFields = [undisturbedField(mesh, wave, 0), undisturbedField(mesh, wave, QUARTER_YEAR_S)]
  return { system, reduced: reduce(system, { extraFields }), mesh }
}
