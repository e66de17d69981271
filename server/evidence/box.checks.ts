import { readTmy3 } from '#engine/climate/tmy3.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { runBox, type BoxOption, type BoxRun } from './parts/box.ts'

const WEATHER = 'climate/tmy3-725650.csv.gz'

/** The test cases 600, 900, 600FF and 900FF, as option files that the program runs like any other. */
export const boxChecks: CheckGroup = {
  topic: 'Test boxes of ANSI/ASHRAE Standard 140',
  run: (inputs) => {
    const text = inputs.shared(WEATHER)
    if (text === null)
      return {
        leftOut: 'the weather of Denver lies in the shared folder beside the project, which is not here',
      }
    const climate = readTmy3(text)
    const option = (file: string) => inputs.data(`examples/std140/${file}.json`)
    const run = (file: string, change?: Parameters<typeof runBox>[2]) => runBox(option(file), climate, change)
    const cases = (change?: Parameters<typeof runBox>[2]) => ({
      '600': run('600', change),
      '900': run('900', change),
      '600FF': run('600ff', change),
      '900FF': run('900ff', change),
    })
    const today = cases()
    const rows = inputs.published('box-ranges.csv')
    return [
      ...ranges(rows, '2020', today),
      ...ranges(rows, '2001', cases(EARLIER_GLASS)),
      ...trends(today, {
        overhang: run('600', OVERHANG),
        setback: run('600', SETBACK),
        nightAir: run('600ff', NIGHT_AIR),
      }),
    ]
  },
}

const SAME_WEATHER = 'Denver TMY3, the weather of that edition; films of the earlier ones.'
const OTHER_WEATHER =
  'The ranges belong to another weather file of Denver, which is not at hand: 1.2 K colder over the year with 10 % more sun. Shown for orientation.'
const NOTES: Readonly<Record<string, string>> = {
  '900FF/lowest':
    'A quarter of a degree above the warmest example, after three dull and cold days in February. A sky 5 K colder, or one that is as cold at the horizon as above, would bring it inside; films, glass and leaks within reason would not.',
}

type Cases = Readonly<Record<'600' | '900' | '600FF' | '900FF', BoxRun>>

/** Clear double glass of the editions from 2001 to 2017: U 3.0, solar factor 0.789 (two panes by Fresnel, extinction 0.0196 per mm). */
const EARLIER_GLASS = (option: BoxOption): BoxOption => ({
  ...option,
  glazings: [
    {
      ...option.glazings[0],
      u_Wm2K: 3,
      transmittance: [0.74656, 0.74592, 0.74371, 0.73881, 0.72832, 0.70472, 0.64737, 0.50719, 0.24224, 0],
      solarFactor: [0.78906, 0.78868, 0.78722, 0.78353, 0.77459, 0.7526, 0.69616, 0.55442, 0.28233, 0],
      diffuseTransmittance: 0.65879,
      diffuseSolarFactor: 0.70454,
    },
  ],
})

/** Case 610: a roof that stands out 1 m along the whole south wall, 0.5 m above the heads. */
const OVERHANG = (option: BoxOption): BoxOption => ({
  ...option,
  sides: option.sides.map((side) => ({
    ...side,
    // It ends 0.5 m beyond the one jamb and 4.5 m beyond the other: the mean stands for both.
    openings: side.openings?.map((one) => ({ ...one, overhang: { depth_m: 1, rise_m: 0.5, extra_m: 2.5 } })),
  })),
})

/** Case 640: 10 °C from 23 to 7 h. */
const SETBACK = (option: BoxOption): BoxOption => ({
  ...option,
  heating: {
    ...option.heating,
    set_C: Array.from({ length: 24 }, (_, hour) => (hour < 7 || hour === 23 ? 10 : 20)),
  },
})

/** After case 650FF: 1,703 m³/h from 18 to 7 h, here only while it is cooler outdoors. */
const NIGHT_AIR = (option: BoxOption): BoxOption => ({
  ...option,
  air: {
    ...option.air,
    flush: { changes_h: 13.14, from_h: 18, to_h: 7, above_C: 5, byAtLeast_K: 0 },
  },
})

function ranges(
  rows: readonly Readonly<Record<string, string>>[],
  era: '2020' | '2001',
  cases: Cases,
): Check[] {
  const source =
    era === '2020'
      ? 'ANSI/ASHRAE Standard 140-2020, example results'
      : 'ANSI/ASHRAE Standard 140-2001 to 2017, example results'
  return rows
    .filter((row) => row.era === era)
    .map((row) => {
      const name = row.case as keyof Cases
      return check({
        id: `${era === '2020' ? 'ZON-05' : 'ZON-04'}/${name}/${row.quantity.replace(' ', '-')}`,
        title: `Case ${name}, ${row.quantity}: lowest to highest of the example results${era === '2020' ? '' : ', glass of the earlier editions'}`,
        source,
        provenance: 'from memory',
        unit: row.unit === 'C' ? '°C' : row.unit,
        expected: [Number(row.low), Number(row.high)],
        tolerance: 0,
        computed: boxValue(cases[name], row.quantity),
        weight: 'soft',
        note: era === '2001' ? OTHER_WEATHER : (NOTES[`${name}/${row.quantity}`] ?? SAME_WEATHER),
      })
    })
}

export function boxValue(run: BoxRun, quantity: string): number {
  switch (quantity) {
    case 'heating':
      return run.heating_MWh
    case 'cooling':
      return run.cooling_MWh
    case 'peak heating':
      return run.peakHeating_kW
    case 'peak cooling':
      return run.peakCooling_kW
    case 'highest':
      return run.highest_C
    case 'lowest':
      return run.lowest_C
    case 'mean':
      return run.mean_C
    default:
      throw new RangeError(`There is no quantity ${quantity}.`)
  }
}

function trends(
  cases: Cases,
  changed: Readonly<Record<'overhang' | 'setback' | 'nightAir', BoxRun>>,
): Check[] {
  const row = (
    name: string,
    title: string,
    unit: string,
    expected: readonly [number, number],
    computed: number,
  ) =>
    check({
      id: `ZON-06/${name}`,
      title,
      source: 'ANSI/ASHRAE Standard 140, what all published ranges have in common',
      provenance: 'from memory',
      unit,
      expected,
      tolerance: 0,
      computed,
    })
  const light = cases['600']
  const heavy = cases['900']
  const freeLight = cases['600FF']
  const freeHeavy = cases['900FF']
  return [
    row(
      'highest',
      'Mass lowers the highest temperature by more than 15 K',
      'K',
      [15, 60],
      freeLight.highest_C - freeHeavy.highest_C,
    ),
    row(
      'lowest',
      'Mass raises the lowest temperature by more than 8 K',
      'K',
      [8, 60],
      freeHeavy.lowest_C - freeLight.lowest_C,
    ),
    row('mean', 'Mass leaves the yearly mean within 1 K', 'K', [-1, 1], freeHeavy.mean_C - freeLight.mean_C),
    row(
      'heating',
      'Mass more than halves the heat: heavy over light',
      '1',
      [0, 0.5],
      heavy.heating_MWh / light.heating_MWh,
    ),
    row(
      'overhang-cooling',
      'An overhang lowers cooling: with over without',
      '1',
      [0, 0.999],
      changed.overhang.cooling_MWh / light.cooling_MWh,
    ),
    row(
      'overhang-heating',
      'An overhang raises heating by less than 3 %: with over without',
      '1',
      [1, 1.03],
      changed.overhang.heating_MWh / light.heating_MWh,
    ),
    row(
      'setback-heating',
      'Letting the night cool down saves heat: with over without',
      '1',
      [0, 0.999],
      changed.setback.heating_MWh / light.heating_MWh,
    ),
    row(
      'setback-peak',
      'Letting the night cool down raises the highest heating power: with over without',
      '1',
      [1.001, 5],
      changed.setback.peakHeating_kW / light.peakHeating_kW,
    ),
    row(
      'night-air',
      'Night air lowers the highest temperature: without above with',
      'K',
      [0.001, 60],
      freeLight.highest_C - changed.nightAir.highest_C,
    ),
  ]
}
