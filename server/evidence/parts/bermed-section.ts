import type { SectionSpec, Substance } from '#engine/conduction/specs.ts'

const soil: Substance = { name: 'damp loam', conductivity_WmK: 1.2, volumetricHeat_Jm3K: 2e6 }
const earth: Substance = { name: 'earth', conductivity_WmK: 0.8, volumetricHeat_Jm3K: 1.7e6 }
const stone: Substance = { name: 'rubble', conductivity_WmK: 1.4, volumetricHeat_Jm3K: 2e6 }

/** A bermed north side with a six-metre umbrella, as a house of the trade has it. */
export const BERMED_SECTION: SectionSpec = {
  kind: 'section',
  halfFloor_m: 2,
  floorLevel_m: 0,
  floor: [{ ...earth, name: 'floor', thickness_m: 0.15 }],
  wall: [{ ...earth, name: 'wall', thickness_m: 0.4 }],
  wallTop_m: 2.6,
  footing: { depth_m: 0.8, substance: stone },
  soil,
  berm: { height_m: 2, crest_m: 0.6, run: 1.8, soil },
  cover: { layers: [{ ...soil, name: 'cover', thickness_m: 0.3 }], reach_m: 6 },
  umbrella: {
    layers: [{ name: 'board', thickness_m: 0.1, conductivity_WmK: 0.036, volumetricHeat_Jm3K: 45000 }],
    reach_m: 6,
  },
  skirt: null,
  films: { floor: 6, wallInside: 7.7, wallOutside: 20, ground: 20 },
  extent: { depth_m: 15, beyond_m: 20 },
  refinement: 1,
  probes: [],
}
