import { addAt, bandMatrix } from './band-matrix.ts'
import type { Layer, LayersSpec } from './specs.ts'
import type { Boundary, Probe, ThermalSystem } from './thermal-system.ts'

const DAY_S = 86400

/** Cell size per distance from the nearest exposed face: slower waves, which are longer, reach further. */
const GROWTH = 0.15

export interface LayersOptions {
  /** 1 is the usual grid; 2 halves every cell. */
  readonly refinement?: number
  /** Temperatures to follow. */
  readonly probes?: readonly DepthProbe[]
}

/** A place behind the inner face [m]. */
export interface DepthProbe {
  readonly name: string
  readonly depth_m: number
}

/**
 * Plane layers as a chain of nodes for 1 m². Nodes stand at the faces of cells, so the outermost ones
 * are the surfaces themselves; a cell gives half of its capacity to each of its two nodes (linear
 * elements with lumped capacity). Cells grow from both exposed faces inwards, from a sixteenth of the depth
 * that a daily wave reaches; a light layer gets few, a massless one a single cell.
 *
 * Boundary groups: `outside` (left out when its film is 0) and `inside`. Node 0 is the outer face.
 *
 * @throws RangeError for no layer, a thickness, conductivity, heat capacity or film out of range
 */
export function layersSystem(spec: LayersSpec, options: LayersOptions = {}): ThermalSystem {
  check(spec)
  const cells = layerCells(spec.layers, options.refinement ?? 1, spec.outsideFilm_Wm2K > 0)
  const nodes = cells.length + 1
  const capacity_JK = new Float64Array(nodes)
  const conductance_WK = bandMatrix(nodes, 1)
  cells.forEach((cell, i) => {
    const half = 0.5 * cell.thickness_m * cell.volumetricHeat_Jm3K
    capacity_JK[i] += half
    capacity_JK[i + 1] += half
    const conductance = cell.conductivity_WmK / cell.thickness_m
    addAt(conductance_WK, i, i, conductance)
    addAt(conductance_WK, i + 1, i + 1, conductance)
    addAt(conductance_WK, i + 1, i, -conductance)
  })
  const boundaries: Boundary[] = []
  const film = (name: string, node: number, value: number) => {
    if (value === 0) return
    addAt(conductance_WK, node, node, value)
    boundaries.push({ name, node: Int32Array.of(node), conductance_WK: Float64Array.of(value) })
  }
  film('outside', 0, spec.outsideFilm_Wm2K)
  film('inside', nodes - 1, spec.insideFilm_Wm2K)
  return { capacity_JK, conductance_WK, boundaries, probes: layerProbes(cells, options.probes ?? []) }
}

function check(spec: LayersSpec): void {
  if (spec.layers.length === 0) throw new RangeError('layers: at least one layer is needed')
  spec.layers.forEach((layer, i) => {
    for (const key of ['thickness_m', 'conductivity_WmK', 'volumetricHeat_Jm3K'] as const)
      if (!(layer[key] > 0 && layer[key] < Infinity))
        throw new RangeError(`layers[${i}].${key} must be more than 0, got ${layer[key]}`)
  })
  if (!(spec.insideFilm_Wm2K > 0))
    throw new RangeError(`insideFilm_Wm2K must be more than 0, got ${spec.insideFilm_Wm2K}`)
  if (!(spec.outsideFilm_Wm2K >= 0))
    throw new RangeError(`outsideFilm_Wm2K must not be negative, got ${spec.outsideFilm_Wm2K}`)
}

/** Cells from outside to inside. */
export function layerCells(layers: readonly Layer[], refinement: number, isOutsideExposed: boolean): Layer[] {
  const total_m = layers.reduce((sum, layer) => sum + layer.thickness_m, 0)
  const cells: Layer[] = []
  let above_m = 0
  for (const layer of layers) {
    const start_m = above_m
    const daily_m = waveDepth(layer, DAY_S)
    const least_m = daily_m / 16
    // Wanted size at a place: small near the exposed faces, growing with the distance to them.
    const wanted = (at_m: number) => {
      const inner_m = total_m - at_m
      const outer_m = isOutsideExposed ? at_m : Infinity
      return (least_m + GROWTH * Math.max(0, Math.min(inner_m, outer_m))) / refinement
    }
    // As many cells as the integral of 1/size asks for, each of equal share of that integral.
    const steps = 200
    const share = new Float64Array(steps + 1)
    for (let i = 0; i < steps; i++) {
      const middle = start_m + ((i + 0.5) / steps) * layer.thickness_m
      share[i + 1] = share[i] + layer.thickness_m / steps / wanted(middle)
    }
    const count = Math.max(1, Math.ceil(share[steps] - 1e-9))
    let last_m = 0
    let i = 0
    for (let n = 1; n <= count; n++) {
      const goal = (share[steps] * n) / count
      while (i < steps - 1 && share[i + 1] < goal) i++
      const within = (goal - share[i]) / (share[i + 1] - share[i])
      const at_m = n === count ? layer.thickness_m : ((i + within) / steps) * layer.thickness_m
      cells.push({ ...layer, thickness_m: at_m - last_m })
      last_m = at_m
    }
    above_m += layer.thickness_m
  }
  return cells
}

/** Depth at which a wave of that period has 1/e of its amplitude: √(λ T / (π ρ c)) [m]. */
function waveDepth(layer: Layer, period_s: number): number {
  return Math.sqrt((layer.conductivity_WmK * period_s) / (Math.PI * layer.volumetricHeat_Jm3K))
}

/**
 * Temperatures at depths from the inner face, linear between nodes.
 *
 * @param cells of the system, from outside to inside, as layerCells gives them
 * @throws RangeError for a depth outside the layers
 */
export function layerProbes(cells: readonly Layer[], wanted: readonly DepthProbe[]): Probe[] {
  const total_m = cells.reduce((sum, cell) => sum + cell.thickness_m, 0)
  return wanted.map(({ name, depth_m }) => {
    if (!(depth_m >= 0 && depth_m <= total_m * (1 + 1e-12)))
      throw new RangeError(`probe ${name}: depth_m must be 0 to ${total_m}, got ${depth_m}`)
    let face_m = total_m
    for (let i = 0; i < cells.length; i++) {
      const next_m = face_m - cells[i].thickness_m
      if (depth_m >= next_m - 1e-12) {
        const share = Math.min(1, Math.max(0, (face_m - depth_m) / cells[i].thickness_m))
        return { name, node: Int32Array.of(i, i + 1), weight: Float64Array.of(1 - share, share) }
      }
      face_m = next_m
    }
    return { name, node: Int32Array.of(cells.length), weight: Float64Array.of(1) }
  })
}
