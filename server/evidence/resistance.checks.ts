import {
  airLayerResistance,
  blackRadiation,
  combinedResistance,
  INSIDE_CONVECTION,
  outsideConvection,
  SURFACE_RESISTANCE,
  surfaceResistance,
  uValue,
  type HeatFlow,
} from '#engine/conduction/resistance.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'
import { chain, drive, modes } from './parts/drive-layers.ts'
import { worst } from './parts/wall-substances.ts'

/** Surfaces, air layers and steady walls. */
export const resistanceChecks: CheckGroup = {
  topic: 'Resistances of layers and surfaces',
  run: (inputs) => [...surfaces(), ...airLayers(inputs), ...steady()],
}

function surfaces(): Check[] {
  const source = 'ISO 6946:2017, Table 7 and Annex C'
  const row = (
    id: string,
    title: string,
    unit: string,
    expected: number,
    computed: number,
    tolerance: number,
  ) =>
    check({
      id: `OPQ-01/${id}`,
      title,
      source,
      provenance: 'from memory',
      unit,
      expected,
      tolerance,
      computed,
    })
  const inside = (flow: HeatFlow, expected: number) =>
    row(
      flow,
      `Inner surface, heat ${flow === 'horizontal' ? 'across' : flow}: 1 / (hc + 0.9 hr) at 20 °C`,
      'm²K/W',
      expected,
      surfaceResistance(INSIDE_CONVECTION[flow], 0.9, 20),
      0.001,
    )
  return [
    inside('up', 0.099),
    inside('horizontal', 0.131),
    inside('down', 0.171),
    row(
      'outside',
      'Outer surface, wind 4 m/s, 10 °C',
      'm²K/W',
      0.041,
      surfaceResistance(outsideConvection(4), 0.9, 10),
      0.001,
    ),
    ...(
      [
        [-10, 4.1],
        [0, 4.6],
        [10, 5.1],
        [20, 5.7],
        [30, 6.3],
      ] as const
    ).map(([mean_C, printed]) =>
      row(
        `radiation/${mean_C}`,
        `Radiation of a black surface at ${mean_C} °C, printed to one place`,
        'W/m²K',
        printed,
        blackRadiation(mean_C),
        0.051,
      ),
    ),
    row(
      'table',
      'Conventional resistances up, across, down and outside against those from Annex C: largest deviation',
      'm²K/W',
      0,
      worst([
        ...(['up', 'horizontal', 'down'] as const).map((flow) =>
          Math.abs(SURFACE_RESISTANCE[flow].inside - surfaceResistance(INSIDE_CONVECTION[flow], 0.9, 20)),
        ),
        Math.abs(SURFACE_RESISTANCE.horizontal.outside - surfaceResistance(outsideConvection(4), 0.9, 10)),
      ]),
      0.0015,
    ),
  ]
}

function airLayers(inputs: EvidenceInputs): Check[] {
  const rows = inputs.published('iso6946-air-layers.csv')
  const flows = ['up', 'horizontal', 'down'] as const
  return [
    check({
      id: 'OPQ-02',
      title: `Unventilated air layers: largest deviation of ${3 * rows.length} values`,
      source: 'ISO 6946:2017, Table 8',
      provenance: 'from memory',
      unit: 'm²K/W',
      expected: 0,
      tolerance: 1e-9,
      computed: worst(
        rows.flatMap((row) =>
          flows.map((flow) =>
            Math.abs(airLayerResistance(Number(row.thickness_mm) / 1000, flow) - Number(row[flow])),
          ),
        ),
      ),
    }),
  ]
}

function steady(): Check[] {
  const plain = [
    { thickness_m: 0.102, conductivity_WmK: 0.77 },
    { thickness_m: 0.1, conductivity_WmK: 0.035 },
    { thickness_m: 0.1, conductivity_WmK: 0.15 },
    { thickness_m: 0.013, conductivity_WmK: 0.25 },
  ]
  const whole = (thickness_m: number, conductivity_WmK: number) => ({
    thickness_m,
    parts: [{ share: 1, conductivity_WmK }],
  })
  const studs = combinedResistance([
    whole(0.012, 0.13),
    {
      thickness_m: 0.14,
      parts: [
        { share: 0.15, conductivity_WmK: 0.13 },
        { share: 0.85, conductivity_WmK: 0.035 },
      ],
    },
    whole(0.0125, 0.25),
  ])
  const wall = modes(
    chain(
      plain.map((one) => ({ ...one, volumetricHeat_Jm3K: 1e6 })),
      { outside: 25, inside: 1 / 0.13 },
    ),
  )
  const settled = drive(wall, 24 * 60, 0, (group) => (group === 1 ? 1 : 0))
  const row = (
    id: string,
    title: string,
    unit: string,
    expected: number,
    computed: number,
    tolerance = 1e-4,
  ) =>
    check({
      id,
      title,
      source: id.startsWith('OPQ-03') ? 'ISO 6946:2017, 6.7.1' : 'ISO 6946:2017, 6.7.2',
      provenance: 'derived',
      unit,
      expected,
      tolerance,
      computed,
    })
  return [
    row('OPQ-03', 'Plasterboard, aerated concrete, wool, brick', 'W/m²K', 0.2578, uValue(plain)),
    row(
      'OPQ-03/modes',
      'The same from its modes after 60 days of 1 K',
      'W/m²K',
      0.2578,
      settled.flow[1][24 * 60 - 1],
    ),
    row('OPQ-04/upper', 'Stud wall, 15 % timber: upper limit', 'm²K/W', 3.2778, studs.upper_m2KW),
    row('OPQ-04/lower', 'Stud wall: lower limit', 'm²K/W', 3.1549, studs.lower_m2KW),
    row('OPQ-04/mean', 'Stud wall: resistance by the combined method', 'm²K/W', 3.2164, studs.mean_m2KW),
    row('OPQ-04/u', 'Stud wall: transmittance', 'W/m²K', 0.3109, studs.u_Wm2K),
    row('OPQ-04/error', 'Stud wall: largest relative error', '%', 1.91, 100 * studs.largestError, 0.005),
  ]
}

/** From outside to inside. */
