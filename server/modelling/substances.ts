import type { LayerInput } from '#contract/assembly.ts'
import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import type { SoilState } from '#contract/soil.ts'
import type { Layer, Substance } from '#engine/conduction/specs.ts'

/** A layer without mass is given the heat capacity of air [J/(m³ K)]; the engine wants some. */
const AIR_JM3K = 1200

/** Looks up ids as the engine's substances, in one soil state. */
export interface Substances {
  readonly of: (id: string) => Substance
  /** Soil that rain reaches in any case: on an umbrella or a roof it is never in its dry state. */
  readonly exposed: (id: string) => Substance
  readonly layers: (list: readonly LayerInput[]) => Layer[]
  readonly exposedLayers: (list: readonly LayerInput[]) => Layer[]
  /** Layers of an assembly; earth in it follows the soil state. */
  readonly assembly: (id: string) => Layer[]
  readonly exposedAssembly: (id: string) => Layer[]
}

interface Solid {
  readonly name: string
  readonly conductivity_WmK: number
  readonly density_kgm3: number
  readonly specificHeat_JkgK: number
}

/** @throws RangeError for an id that neither option nor library knows */
export function substancesOf(option: Option, library: Library, state: SoilState): Substances {
  const rainState = state === 'dry' ? 'damp' : state
  const find = (id: string, soilState: SoilState): Substance => {
    const solid = solidOf(option, library, id, soilState)
    if (!solid) throw new RangeError(`There is no material or soil "${id}".`)
    return {
      name: solid.name,
      conductivity_WmK: solid.conductivity_WmK,
      volumetricHeat_Jm3K: solid.density_kgm3 * solid.specificHeat_JkgK || AIR_JM3K,
    }
  }
  const of = (id: string) => find(id, state)
  const exposed = (id: string) => find(id, rainState)
  const layersOf = (lookUp: (id: string) => Substance) => (list: readonly LayerInput[]) =>
    list.map(({ material, thickness_m }) => ({ ...lookUp(material), thickness_m }))
  const assembly = (id: string) => {
    const found = option.assemblies.find((one) => one.id === id)
    if (!found) throw new RangeError(`There is no assembly "${id}".`)
    return found.layers
  }
  const layers = layersOf(of)
  const exposedLayers = layersOf(exposed)
  return {
    of,
    exposed,
    layers,
    exposedLayers,
    assembly: (id) => layers(assembly(id)),
    exposedAssembly: (id) => exposedLayers(assembly(id)),
  }
}

function solidOf(option: Option, library: Library, id: string, state: SoilState): Solid | undefined {
  const own = option.materials.find((row) => row.id === id)
  if (own) return own
  const ownSoil = option.soils.find((row) => row.id === id)
  if (ownSoil) return { name: ownSoil.name, ...ownSoil[state] }
  const material = library.materials.get(id)
  if (material) return typical(material.name, material)
  const soil = library.soils.get(id)
  return soil ? typical(`${soil.name}, ${state}`, soil[state]) : undefined
}

function typical(
  name: string,
  row: {
    readonly conductivity_WmK: { readonly typical: number }
    readonly density_kgm3: { readonly typical: number }
    readonly specificHeat_JkgK: { readonly typical: number }
  },
): Solid {
  return {
    name,
    conductivity_WmK: row.conductivity_WmK.typical,
    density_kgm3: row.density_kgm3.typical,
    specificHeat_JkgK: row.specificHeat_JkgK.typical,
  }
}
