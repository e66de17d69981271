import type { Option } from '#contract/option.ts'
import type { Layer } from '#engine/conduction/specs.ts'
import type { HouseElement, RoomSurface } from '#engine/zone/house-model.ts'
import { whole, type SurfaceFilms } from './surface-films.ts'
import type { Substances } from './substances.ts'

/** Of a litre of water at room temperature [J/K] (ISO 10456, Table 3: 1000 kg/m³, 4190 J/(kg K)). */
const LITRE_JK = 4190

/** Partitions and water containers. */
export function insideMass(option: Option, substances: Substances, films: SurfaceFilms): HouseElement[] {
  const surface = (name: string, area_m2: number, solarAbsorptance: number): RoomSurface => ({
    name,
    area_m2,
    ...films.mass,
    solarAbsorptance,
    part: 'mass',
    faces_deg: null,
  })
  const partitions = option.partitions.flatMap(({ name, area_m2, assembly, insideAbsorptance }) => {
    const [one, other] = halves(substances.assembly(assembly))
    const half = (title: string, layers: readonly Layer[], area_m2: number): HouseElement => ({
      name: title,
      spec: { kind: 'layers', layers, outsideFilm_Wm2K: 0, insideFilm_Wm2K: whole(films.mass) },
      size: area_m2,
      links: { inside: { to: 'room', surface: surface(title, area_m2, insideAbsorptance) } },
    })
    // Both faces see the same room, so nothing crosses the middle of an even wall; of an uneven one little.
    return JSON.stringify(one) === JSON.stringify(other)
      ? [half(name, one, 2 * area_m2)]
      : [half(`${name}, one face`, one, area_m2), half(`${name}, other face`, other, area_m2)]
  })
  const water = option.water.map(({ name, litres, surface_m2, insideAbsorptance }): HouseElement => ({
    name,
    spec: { kind: 'lumped', capacity_JK: litres * LITRE_JK, conductance_WK: surface_m2 * whole(films.mass) },
    size: 1,
    links: { inside: { to: 'room', surface: surface(name, surface_m2, insideAbsorptance) } },
  }))
  return [...partitions, ...water]
}

/** A wall cut in the middle: each half from the middle to its face. */
export function halves(layers: readonly Layer[]): [one: Layer[], other: Layer[]] {
  const middle_m = layers.reduce((sum, layer) => sum + layer.thickness_m, 0) / 2
  return [half([...layers].reverse(), middle_m), half(layers, middle_m)]
}

/** What lies beyond the middle. */
function half(layers: readonly Layer[], middle_m: number): Layer[] {
  let from_m = 0
  return layers.flatMap((layer) => {
    const to_m = from_m + layer.thickness_m
    const beyond_m = to_m - Math.max(from_m, middle_m)
    from_m = to_m
    return beyond_m > 1e-9 ? [{ ...layer, thickness_m: Number(beyond_m.toFixed(9)) }] : []
  })
}
