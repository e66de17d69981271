import type { OptionInput } from '#contract/option.ts'

/** Clear double glass, by angle (derived from two panes of 3.175 mm, see the test cases). */
export const clearGlass = {
  id: 'glass',
  name: 'Clear double glass',
  u_Wm2K: 2.8,
  transmittance: [0.75, 0.75, 0.74, 0.74, 0.73, 0.7, 0.65, 0.51, 0.24, 0],
  solarFactor: [0.79, 0.79, 0.79, 0.78, 0.77, 0.75, 0.7, 0.55, 0.28, 0],
  diffuseTransmittance: 0.66,
  diffuseSolarFactor: 0.7,
}

/** A bermed room of 10 by 6 m that is right in every respect; a fresh one at each call. */
export function plainOption() {
  return structuredClone(plain)
}

const plain = {
  loamkeep: 1,
  name: 'Plain room',
  soil: { id: 'loam', guess: 'damp' },
  room: { height_m: 2.5 },
  assemblies: [
    { id: 'wall', layers: [{ material: 'adobe', thickness_m: 0.35 }] },
    { id: 'floor', layers: [{ material: 'concrete_medium', thickness_m: 0.1 }] },
    {
      id: 'roof',
      layers: [
        { material: 'cellulose', thickness_m: 0.3 },
        { material: 'softwood', thickness_m: 0.02 },
      ],
    },
  ],
  sides: [
    {
      name: 'North',
      length_m: 10,
      faces_deg: 0,
      wall: 'wall',
      berm: { height_m: 1.5, crest_m: 1, runPerRise: 2 },
      umbrella: { layers: [{ material: 'xps_buried_code', thickness_m: 0.1 }], reach_m: 3 },
      cover: { surface: 'mulch', layers: [{ material: 'loam', thickness_m: 0.2 }] },
    },
    { name: 'East', length_m: 6, faces_deg: 90, wall: 'wall' },
    {
      name: 'South',
      length_m: 10,
      faces_deg: 180,
      wall: 'wall',
      openings: [
        {
          kind: 'window',
          name: 'Window',
          width_m: 3,
          height_m: 1.5,
          sill_m: 0.5,
          glazing: 'glass',
          fromLeft_m: 1,
        },
        {
          kind: 'door',
          name: 'Door',
          width_m: 0.9,
          height_m: 2,
          sill_m: 0,
          u_Wm2K: 1.5,
          fromLeft_m: 6,
        },
      ],
    },
    { name: 'West', length_m: 6, faces_deg: 270, wall: 'wall' },
  ],
  floor: { assembly: 'floor' },
  roof: { assembly: 'roof' },
  glazings: [clearGlass],
} satisfies OptionInput
