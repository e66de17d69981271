import { atIncidence } from '#engine/solar/at-incidence.ts'
import { catalogueGlazing, clearGlazing, stackOptics, type Pane } from '#engine/solar/glazing.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'

const BOX_PANE: Pane = { thickness_m: 0.003175, extinction_m: 19.6, refractiveIndex: 1.526 }
const BOX_FILMS = { outside_Wm2K: 21, inside_Wm2K: 8.29, gap_Wm2K: 6.297, pane_Wm2K: 333 }
const BOOK = 'Duffie and Beckman, Solar Engineering of Thermal Processes'

/** Light and heat through glass over the angle of incidence. */
export const glazingChecks: CheckGroup = {
  topic: 'Glazing',
  run: (inputs) => [...fresnel(), ...boxPane(inputs), ...handbook(inputs), ...defaults(inputs)],
}

function fresnel(): Check[] {
  const plain: Pane = { thickness_m: 0, extinction_m: 0, refractiveIndex: 1.526 }
  const thin: Pane = { thickness_m: 0.0023, extinction_m: 32, refractiveIndex: 1.526 }
  const single = stackOptics([thin], 60)
  const row = (id: string, title: string, where: string, expected: number, computed: number) =>
    check({
      id: `WIN-01/${id}`,
      title,
      source: `${BOOK}, ${where}`,
      provenance: 'from memory',
      unit: '-',
      expected,
      tolerance: 0.001,
      computed,
    })
  return [
    row(
      'covers/0',
      'Two covers, head on',
      'example 5.1.2',
      0.8465,
      stackOptics([plain, plain], 0).transmittance,
    ),
    row(
      'covers/60',
      'Two covers, 60°',
      'example 5.1.2',
      0.7588,
      stackOptics([plain, plain], 60).transmittance,
    ),
    row('through', 'One pane, 60°: let through', 'example 5.3.1', 0.7683, single.transmittance),
    row('back', 'One pane, 60°: thrown back', 'example 5.3.1', 0.147, single.reflectance),
    row('kept', 'One pane, 60°: absorbed', 'example 5.3.1', 0.0847, single.absorptance[0]),
  ]
}

function boxPane(inputs: EvidenceInputs): Check[] {
  const source = 'ANSI/ASHRAE Standard 140, editions 2001 to 2017, window'
  const glazing = clearGlazing([BOX_PANE, BOX_PANE], BOX_FILMS)
  const row = (
    id: string,
    title: string,
    expected: number,
    computed: number,
    tolerance = 0.001,
    unit = '-',
  ) =>
    check({ id: `WIN-02/${id}`, title, source, provenance: 'derived', unit, expected, tolerance, computed })
  let apart = 0
  let lost = 0
  for (const line of inputs.published('test-box-double-pane.csv')) {
    const angle_deg = Number(line.incidence_deg)
    const optics = stackOptics([BOX_PANE, BOX_PANE], angle_deg)
    const pairs = [
      [line.transmittance, optics.transmittance],
      [line.reflectance, optics.reflectance],
      [line.outer, optics.absorptance[0]],
      [line.inner, optics.absorptance[1]],
      [line.solar_factor, glazing.solarFactor[angle_deg / 10]],
    ] as const
    for (const [printed, computed] of pairs) apart = Math.max(apart, Math.abs(Number(printed) - computed))
    const sum = optics.transmittance + optics.reflectance + optics.absorptance[0] + optics.absorptance[1]
    lost = Math.max(lost, Math.abs(sum - 1))
  }
  let between = 0
  for (let angle_deg = 0; angle_deg <= 90; angle_deg++) {
    const exact = stackOptics([BOX_PANE, BOX_PANE], angle_deg).transmittance
    between = Math.max(between, Math.abs(atIncidence(glazing.transmittance, angle_deg) - exact))
  }
  return [
    row('table', 'Two panes: largest deviation of 45 values from 0 to 80°', 0, apart),
    row(
      'diffuse/transmittance',
      'Two panes: diffuse light let through',
      0.65879,
      glazing.diffuseTransmittance,
    ),
    row('diffuse/solar-factor', 'Two panes: diffuse solar factor', 0.70454, glazing.diffuseSolarFactor),
    row(
      'single',
      'One such pane: diffuse light let through',
      0.78609,
      clearGlazing([BOX_PANE], BOX_FILMS).diffuseTransmittance,
    ),
    row('u', 'Two panes: U-value', 3, glazing.u_Wm2K, 0.01, 'W/(m² K)'),
    row('between', 'Two panes: largest error between the ten angles', 0, between, 0.01),
    {
      ...row('sum', 'Let through, thrown back and absorbed sum to 1: largest deviation', 0, lost, 1e-12),
      id: 'WIN-06',
      source: 'Conservation of energy',
    },
  ]
}

const OTHER_WAY =
  'For panes behind each other the printed curve follows when the two polarizations are averaged pane by pane (within 0.012 for 5a and 29a, extinction 30/m). Light keeps its polarization from pane to pane: the program sums each by itself, as the test box does, and is higher near 60 to 80°.'

/** The handbook's curves against the shape that library rows take from U and g alone. */
function handbook(inputs: EvidenceInputs): Check[] {
  return inputs.published('solar-heat-gain-by-angle.csv').map((row) => {
    const glazing = catalogueGlazing(2, Number(row.d0), Number(row.panes))
    const pairs = [40, 50, 60, 70, 80].map(
      (angle_deg) => glazing.solarFactor[angle_deg / 10] - Number(row[`d${angle_deg}`]),
    )
    const isSeen = row.provenance === 'looked up'
    return check({
      id: `WIN-03/${row.id}`,
      title: `Solar factor of ${row.name} from 40 to 80° and diffuse, from the value head on: largest deviation`,
      source: 'ASHRAE Handbook of Fundamentals 2005, chapter 31',
      provenance: isSeen ? 'looked up' : 'from memory',
      unit: '-',
      expected: 0,
      tolerance: 0.02,
      computed: Math.max(...pairs.map(Math.abs), Math.abs(glazing.diffuseSolarFactor - Number(row.diffuse))),
      weight: isSeen ? 'hard' : 'soft',
      note: isSeen ? undefined : OTHER_WAY,
    })
  })
}

/** The library's solar factors, and how much less comes from everywhere, beside the defaults of the standards. */
function defaults(inputs: EvidenceInputs): Check[] {
  const { glazings } = JSON.parse(inputs.data('glazings.json')) as {
    glazings: { id: string; solarFactor: number[]; diffuseSolarFactor: number }[]
  }
  const rowOf = (id: string) => glazings.find((glazing) => glazing.id === id)!
  const shared = {
    source: 'Defaults of ISO 13790 and ISO 52016-1',
    provenance: 'from memory',
    unit: '-',
    tolerance: 0.02,
  } as const
  const defaults = [
    ['single_clear', 'one pane', 0.85],
    ['double_clear', 'two panes', 0.75],
    ['double_low_e', 'two panes, one coated', 0.67],
    ['triple_clear', 'three panes', 0.7],
    ['triple_low_e', 'three panes, two coated', 0.5],
    ['double_sashes', 'a double window', 0.75],
  ] as const
  return [
    ...defaults.map(([id, name, expected]) =>
      check({
        ...shared,
        id: `WIN-05/${id}`,
        title: `Solar factor head on of ${name}, as in the library`,
        expected,
        computed: rowOf(id).solarFactor[0],
      }),
    ),
    check({
      ...shared,
      id: 'WIN-05/everywhere',
      title:
        'Solar factor for light from everywhere over that head on, two clear panes: usual factor for glass',
      expected: 0.9,
      computed: rowOf('double_clear').diffuseSolarFactor / rowOf('double_clear').solarFactor[0],
    }),
  ]
}
