import { CORD_M3, firewood } from '#engine/measures/firewood.ts'
import { massDepth } from '#engine/measures/mass-depth.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'

/** What part of a mass serves the day, and what stored heat is worth as wood. */
export const massDepthChecks: CheckGroup = {
  topic: 'Depth of useful mass and firewood',
  run: (inputs) => [...diurnal(inputs), ...practice()],
}

const adiabatic = { kind: 'film', film_Wm2K: 0 } as const

function held(material: { conductivity_WmK: number; volumetricHeat_Jm3K: number }, thickness_m: number) {
  return massDepth('slab', 'slab', [{ ...material, name: 'slab', thickness_m }], adiabatic, thickness_m).day
}

function diurnal(inputs: EvidenceInputs): Check[] {
  const source = 'Balcomb et al., Passive Solar Heating Analysis, ASHRAE 1984 (formula from memory)'
  const rows = inputs.published('diurnal-heat-capacity.csv').map((row) => {
    const material = {
      conductivity_WmK: Number(row.conductivity_WmK),
      volumetricHeat_Jm3K: Number(row.volumetricHeat_Jm3K),
    }
    const found = held(material, Number(row.thickness_mm) / 1000).held_Whm2K
    return { row, expected: Number(row.held_Whm2K), found }
  })
  const telling = rows.filter(({ row }) => row.thickness_mm === '100' || row.thickness_mm === '300')
  return [
    ...telling.map(({ row, expected, found }) =>
      check({
        id: `MAS-01/${row.material}/${row.thickness_mm}`,
        title: `Heat that ${row.thickness_mm} mm of ${row.material} hold for 1 K of daily swing`,
        source,
        provenance: 'derived',
        unit: 'Wh/m²K',
        expected,
        tolerance: 1e-3 * expected,
        computed: found,
      }),
    ),
    check({
      id: 'MAS-01/all',
      title: `Largest deviation of ${rows.length} diurnal heat capacities`,
      source,
      provenance: 'derived',
      unit: '%',
      expected: 0,
      tolerance: 0.1,
      computed: rows.reduce(
        (worst, { expected, found }) => Math.max(worst, 100 * Math.abs(found / expected - 1)),
        rows.length ? 0 : NaN,
      ),
      note: 'Given to two places.',
    }),
  ]
}

function practice(): Check[] {
  const adobe = { conductivity_WmK: 0.6, volumetricHeat_Jm3K: 1.6e6 }
  // 24 million Btu a cord, 1 Btu = 1055.06 J.
  const hardwood = { name: 'dry hardwood', netHeat_MJkg: 15, stackedHeat_MJm3: (24 * 1055.06) / CORD_M3 }
  return [
    check({
      id: 'TRD-10/depth',
      title: 'Depth of a thick adobe wall that holds 90 % of the heat of a daily swing',
      source: 'rule of the trade: mass of 4 to 6 in is effective, more gives little in a day',
      provenance: 'common practice',
      unit: 'm',
      expected: [0.1, 0.15],
      tolerance: 0.01,
      computed: held(adobe, 0.6).depth90_m,
      weight: 'soft',
    }),
    check({
      id: 'MAS-02/cord',
      title: 'Dry hardwood that gives 2,000 kWh in a stove of 65 %, at 24 million Btu a cord',
      source: 'extension tables of firewood; stove efficiency as usually taken',
      provenance: 'common practice',
      unit: 'cords',
      expected: [0.4, 0.5],
      tolerance: 0,
      computed: firewood(2000, hardwood, 0.65).cords,
      weight: 'soft',
      note: 'A 5 K swing of a store of 410 kWh/K: under half a cord.',
    }),
  ]
}
