import {
  basementUValues,
  characteristicDimension,
  edgeInsulation,
  equivalentThickness,
  slabPeriodic,
  slabUValue,
  type GroundFloor,
} from '#engine/conduction/ground-standard.ts'
import { sectionSystem } from '#engine/conduction/section.ts'
import type { SectionSpec } from '#engine/conduction/specs.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { steady } from './parts/rectangle.ts'

const SOURCE = 'ISO 13370:2017'
const waveDepth = (conductivity: number, volumetric: number) =>
  Math.sqrt((conductivity * 3.15e7) / (Math.PI * volumetric))

const floor = (soil_WmK: number, floor_m2KW: number): GroundFloor => ({
  area_m2: 80,
  perimeter_m: 36,
  wall_m: 0.3,
  soil_WmK,
  floor_m2KW,
})

export const groundStandardChecks: CheckGroup = {
  topic: 'Ground floors by ISO 13370',
  run: () => [...slabs(), ...edges(), ...basement(), ...sections()],
}

const row = (id: string, title: string, unit: string, expected: number, computed: number): Check =>
  check({ id, title, source: SOURCE, provenance: 'derived', unit, expected, tolerance: 1e-3, computed })

function slabs(): Check[] {
  const cases: [string, number, number, number, number, number, number, number][] = [
    // soil, volumetric heat, floor resistance, dt, U, inside, outside
    ['i', 2, 2e6, 0, 0.72, 0.8214, 57.246, 44.915],
    ['ii', 2, 2e6, 2.5, 5.72, 0.258, 21.411, 11.737],
    ['iii', 1.5, 3e6, 2.5, 4.365, 0.2349, 21.438, 8.273],
  ]
  return [
    row(
      'GND-14/B',
      'Characteristic dimension of 10 by 8 m',
      'm',
      4.4444,
      characteristicDimension(floor(2, 0)),
    ),
    ...cases.flatMap(([id, soil, volumetric, resistance, dt, u, inside, outside]) => {
      const slab = floor(soil, resistance)
      const periodic = slabPeriodic(slab, waveDepth(soil, volumetric))
      return [
        row(`GND-14/${id}/d`, `Slab ${id}: equivalent thickness`, 'm', dt, equivalentThickness(slab)),
        row(`GND-14/${id}/U`, `Slab ${id}: steady U-value`, 'W/(m² K)', u, slabUValue(slab)),
        row(
          `GND-14/${id}/inside`,
          `Slab ${id}: periodic coefficient of the room`,
          'W/K',
          inside,
          periodic.inside_WK,
        ),
        row(
          `GND-14/${id}/outside`,
          `Slab ${id}: periodic coefficient of the air`,
          'W/K',
          outside,
          periodic.outside_WK,
        ),
      ]
    }),
  ]
}

function edges(): Check[] {
  const slab = floor(2, 0)
  const edge = { size_m: 1, thickness_m: 0.06, conductivity_WmK: 0.035 }
  const upright = edgeInsulation(slab, { ...edge, way: 'upright' })
  return [
    row(
      'GND-15/level',
      'Wing of 1 m, 60 mm board',
      'W/(m K)',
      -0.4151,
      edgeInsulation(slab, { ...edge, way: 'level' }),
    ),
    row('GND-15/upright', 'Skirt of 1 m, 60 mm board', 'W/(m K)', -0.5926, upright),
    row(
      'GND-15/U',
      'Slab with the skirt: U-value',
      'W/(m² K)',
      0.5547,
      slabUValue(slab) + (2 * upright) / characteristicDimension(slab),
    ),
  ]
}

function basement(): Check[] {
  const found = basementUValues(floor(2, 0.5), 2.5, 1)
  return [
    row('GND-16/floor', 'Heated basement 2.5 m deep: floor', 'W/(m² K)', 0.4112, found.floor),
    row('GND-16/wall', 'Heated basement 2.5 m deep: walls', 'W/(m² K)', 0.4456, found.wall),
    row('GND-16/mean', 'Heated basement 2.5 m deep: together', 'W/(m² K)', 0.4294, found.mean),
  ]
}

/** The program's section of the same floor against the standard's formula, which approximates it. */
function sections(): Check[] {
  return [0, 2.5].map((resistance) => {
    const slab = floor(2, resistance)
    const half = characteristicDimension(slab) / 2
    const soil = { name: 'soil', conductivity_WmK: 2, volumetricHeat_Jm3K: 2e6 }
    const wall = { name: 'wall', thickness_m: 0.3, conductivity_WmK: 0.01, volumetricHeat_Jm3K: 1e6 }
    const layer =
      resistance > 0
        ? { name: 'floor', thickness_m: 0.1, conductivity_WmK: 0.1 / resistance, volumetricHeat_Jm3K: 1e5 }
        : { ...soil, name: 'floor', thickness_m: 0.1 }
    const spec: SectionSpec = {
      kind: 'section',
      halfFloor_m: half,
      floorLevel_m: 0.1,
      floor: [layer],
      wall: [wall],
      wallTop_m: 0.5,
      footing: null,
      soil,
      berm: null,
      cover: null,
      umbrella: null,
      skirt: null,
      films: { floor: 1 / 0.17, wallInside: 1 / 0.13, wallOutside: 25, ground: 25 },
      extent: { depth_m: 60, beyond_m: 60 },
      refinement: 1,
      probes: [],
    }
    const { system } = sectionSystem(spec)
    const names = system.boundaries.map(({ name }) => name)
    const { flow } = steady(
      system,
      names.map((name) => (name === 'floor' || name === 'wall-inside' ? 1 : 0)),
    )
    const expected = slabUValue(slab)
    return check({
      id: `GND-14/section/${resistance}`,
      title: `Ground section of the same slab, floor resistance ${resistance} m²K/W: U-value against the formula`,
      source: `${SOURCE}, clause 7.2`,
      provenance: 'derived',
      unit: 'W/(m² K)',
      weight: 'soft',
      expected,
      tolerance: 0.1 * expected,
      computed: flow[names.indexOf('floor')] / half,
      note: 'The formula lumps wall, films and soil into one thickness; the section has a wall that hardly conducts. 10 % apart is what such sums allow.',
    })
  })
}
