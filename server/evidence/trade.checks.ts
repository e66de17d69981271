import { HOURS, HOUR_S, type ClimateYear } from '#engine/climate/climate-year.ts'
import { dailyMeans, dailyRanges } from '#engine/climate/day-values.ts'
import { generateYear } from '#engine/climate/generate-year.ts'
import { undisturbedGround } from '#engine/climate/ground.ts'
import { firstHarmonic } from '#engine/climate/harmonic.ts'
import { readTmy3 } from '#engine/climate/tmy3.ts'
import type { Layer } from '#engine/conduction/specs.ts'
import { planeIrradiance } from '#engine/solar/plane.ts'
import { sunAt, sunOfYear } from '#engine/solar/sun.ts'
import { chargingYears } from '#engine/year/charging.ts'
import { repeatingYear } from '#engine/year/repeating-year.ts'
import type { YearTrace } from '#engine/year/year-trace.ts'
import { assemble } from '#engine/zone/assemble.ts'
import type { ElementCache } from '#engine/zone/element-cache.ts'
import { BUILT_IN_SEED } from '../climates/library.ts'
import { parseNormals } from '../climates/normals-file.ts'
import { loadLibrary } from '../libraries/library.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'
import { DRY_BERM_SOIL, earthHouse, type EarthHouse } from './parts/earth-house.ts'
import { plainRoom } from './parts/plain-room.ts'
import { waveFromWeather } from './parts/surface-balance.ts'

/** What the trade says, against what the program computes. */
export const tradeChecks: CheckGroup = {
  topic: 'Sayings of the trade',
  run: (inputs) => [
    ...deepSoil(inputs),
    ...walls(inputs),
    ...houses(inputs),
    ...overhangs(inputs),
    ...turnedGlass(inputs),
  ],
}

const FOOT_M = 0.3048
const common = { provenance: 'common practice', weight: 'soft' } as const

function builtIn(inputs: EvidenceInputs, id: string): ClimateYear {
  const place = parseNormals(inputs.data('climates/normals.json')).find((one) => one.id === id)
  if (!place) throw new RangeError(`There is no built-in climate ${id}.`)
  return generateYear(place.normals, BUILT_IN_SEED)
}

/** Amplitude [K per K at the surface] and delay [d] of the year at a depth. */
function yearAt(depth_m: number, diffusivity_m2s: number): { amplitude: number; delay_d: number } {
  const wave = { mean_C: 0, amplitude_K: 1, coldest_s: 0, diffusivity_m2s }
  const depth = Float64Array.of(depth_m)
  const { amplitude, coldest_s } = firstHarmonic(
    Float64Array.from({ length: HOURS }, (_, hour) => undisturbedGround(wave, depth, (hour + 1) * HOUR_S)[0]),
  )
  return { amplitude, delay_d: coldest_s / 86400 }
}

function deepSoil(inputs: EvidenceInputs): Check[] {
  const dry_m2s = DRY_BERM_SOIL.conductivity_WmK / DRY_BERM_SOIL.volumetricHeat_Jm3K
  const grass = loadLibrary().covers.get('grass')
  if (!grass) throw new RangeError('There is no grass among the covers.')
  const deep = waveFromWeather(builtIn(inputs, 'missoula'), grass, DRY_BERM_SOIL, 6)
  return [
    check({
      id: 'GND-13/amplitude',
      title:
        'What is left of a swing at the surface, of 1, at 20 ft in soil where the year comes half a year late',
      source: 'Carslaw and Jaeger 1959, 2.6: e^-π',
      provenance: 'derived',
      unit: '1',
      expected: 0.0432,
      tolerance: 0.0005,
      computed: yearAt(20 * FOOT_M, 3.7509e-7).amplitude,
    }),
    check({
      ...common,
      id: 'TRD-02',
      title: '20 ft of dry earth carry summer into winter, some six months: delay in the dry loam of a berm',
      source: 'J. Hait 1983, as paraphrased',
      unit: 'd',
      expected: [150, 215],
      tolerance: 0,
      computed: yearAt(20 * FOOT_M, dry_m2s).delay_d,
      note: 'True of the delay; what arrives is some 6 % of the swing.',
    }),
    check({
      ...common,
      id: 'TRD-01/20ft',
      title: 'The yearly wave levels off at about 20 ft: what is left of it there, of 1, in dry loam',
      source: 'J. Hait, Mother Earth News, January 1985',
      unit: '1',
      expected: [0, 0.1],
      tolerance: 0,
      computed: yearAt(20 * FOOT_M, dry_m2s).amplitude,
    }),
    check({
      ...common,
      id: 'TRD-01/10ft',
      title: '… and not before: what is left of it at 10 ft',
      source: 'J. Hait, Mother Earth News, January 1985',
      unit: '1',
      expected: [0.1, 1],
      tolerance: 0,
      computed: yearAt(10 * FOOT_M, dry_m2s).amplitude,
    }),
    check({
      ...common,
      id: 'TRD-06',
      title: 'Deep ground at Missoula, 45 °F: undisturbed ground under grass in the built-in climate',
      source: 'J. Hait, Popular Science, August 1986',
      unit: '°C',
      expected: 7.2,
      tolerance: 1.2,
      computed: deep.mean,
      note: 'From air, sun and sky over grass. Tolerance: the span of the share of sun that evaporates.',
    }),
  ]
}

/** Two closed rooms in the March of a dry and sunny place: mean daily swing of one over that of the other. */
function walls(inputs: EvidenceInputs): Check[] {
  const climate = builtIn(inputs, 'kerman')
  const swing_K = (shell: Layer) => {
    const { trace } = repeatingYear(assemble(plainRoom(shell), climate))
    const march = dailyRanges(trace.air_C).subarray(59, 90)
    return march.reduce((sum, value) => sum + value, 0) / march.length
  }
  const earth = { name: 'earth', thickness_m: 0.5, conductivity_WmK: 0.6, volumetricHeat_Jm3K: 1.6e6 }
  const concrete = { name: 'concrete', thickness_m: 0.1, conductivity_WmK: 1.8, volumetricHeat_Jm3K: 2.4e6 }
  return [
    check({
      ...common,
      id: 'OPQ-08/swing',
      title:
        'A room of 0.5 m of earth swings a quarter as much in a day as one of 0.1 m of concrete, or less',
      source: 'H. Fathy, trial houses at Cairo, March 1964, as told by G. Minke: 4 K and 16 K',
      unit: '1',
      expected: [0, 0.25],
      tolerance: 0,
      computed: swing_K(earth) / swing_K(concrete),
      note: 'Another dry and sunny place (Kerman) and rooms without openings: a comparison of kinds. The trial houses had windows, which make the earth room swing more.',
    }),
  ]
}

function houses(inputs: EvidenceInputs): Check[] {
  const climate = builtIn(inputs, 'missoula')
  const cache: ElementCache = new Map()
  const yearOf = (house: EarthHouse) => repeatingYear(assemble(earthHouse(house), climate, cache)).trace
  const bare = yearOf({ isBermed: false, umbrella_m: 0, wall_m: 0.4 })
  const bermed = yearOf({ isBermed: true, umbrella_m: 0, wall_m: 0.4 })
  const covered = assemble(earthHouse({ isBermed: true, umbrella_m: 6, wall_m: 0.4 }), climate, cache)
  const charging = chargingYears(covered, cache, { month: 9, years: 5 })
  const settled = repeatingYear(covered).trace
  const swing = (operative_C: Float64Array) => 2 * firstHarmonic(operative_C).amplitude
  const coldest = (operative_C: Float64Array) => Math.min(...dailyMeans(operative_C))
  const house = 'the same house at Missoula, no heating'
  const source = 'Builders of earth-sheltered houses'
  const ground_J = (trace: YearTrace, value: (element: YearTrace['elements'][number]) => number) =>
    trace.elements.reduce((sum, element) => sum + (element.kind === 'section' ? value(element) : 0), 0)
  const { firstHour } = charging[0]
  const endOfYear = firstHour - 1
  const start_J = ground_J(charging[0], (element) => element.startStored_J)
  const taken = (trace: YearTrace) => ground_J(trace, (element) => element.stored_J[endOfYear]) - start_J
  const late = charging.findIndex(
    (year) => Math.abs(coldest(year.operative_C) - coldest(settled.operative_C)) < 0.5,
  )
  return [
    check({
      ...common,
      id: 'TRADE/swing-bermed',
      title: `Yearly swing with a berm on three sides and an umbrella of 6 m, over that without: ${house}`,
      source,
      unit: '1',
      expected: [0, 1],
      tolerance: 0,
      computed: swing(settled.operative_C) / swing(bare.operative_C),
    }),
    check({
      ...common,
      id: 'TRADE/swing-umbrella',
      title: `Yearly swing with berm and umbrella, over that with the berm alone: ${house}`,
      source,
      unit: '1',
      expected: [0, 1],
      tolerance: 0,
      computed: swing(settled.operative_C) / swing(bermed.operative_C),
    }),
    check({
      ...common,
      id: 'TRADE/coldest-day',
      title: `Coldest day, with berm and umbrella above that without: ${house}`,
      source,
      unit: 'K',
      expected: [0, 30],
      tolerance: 0,
      computed: coldest(settled.operative_C) - coldest(bare.operative_C),
    }),
    check({
      ...common,
      id: 'TRD-08',
      title: 'Two to four years to charge: years until the coldest day is within 0.5 K of its last value',
      source: 'J. Hait; builders',
      unit: 'a',
      expected: [2, 4],
      tolerance: 0,
      computed: late + 1,
      note: 'The room feels little after its first winter; the soil around it takes up heat for decades (see the next line).',
    }),
    check({
      ...common,
      id: 'TRD-08/ground',
      title:
        'The same by the heat in the ground to 15 m deep: what it holds after four years of what it takes up in the end',
      source: 'J. Hait; builders',
      unit: '%',
      expected: [95, 100],
      tolerance: 0,
      computed: (100 * taken(charging[3])) / taken(settled),
      note: 'A slab of 20 ft, closed behind, would have 99 % by then; open ground leads the heat away and is never full.',
    }),
  ]
}

function overhangs(inputs: EvidenceInputs): Check[] {
  const rows = inputs.published('overhang-factors.csv').map((row) => ({
    latitude_deg: Number(row.latitude_deg),
    low: Number(row.low),
    high: Number(row.high),
  }))
  const noonTangent = (latitude_deg: number, day: number) => {
    const place = { name: 'on the meridian', latitude_deg, longitude_deg: 0, elevation_m: 0, timeZone_h: 0 }
    // Noon wanders by a quarter of an hour through the year.
    const minutes = Array.from({ length: 61 }, (_, i) => 24 * day + 11.5 + i / 60)
    const highest = Math.max(...minutes.map((hour) => sunAt(place, hour).altitude_deg))
    return Math.tan((highest * Math.PI) / 180)
  }
  const JUNE_21 = 171
  const AUGUST_1 = 212
  const apart = (day: number, printed: (row: (typeof rows)[number]) => number, from_deg: number) =>
    Math.max(
      ...rows
        .filter((row) => row.latitude_deg >= from_deg)
        .map((row) => Math.abs(noonTangent(row.latitude_deg, day) - printed(row))),
    )
  const nearest = (rule: number, latitude_deg: number) => {
    const [low, high] = [1 / noonTangent(latitude_deg, JUNE_21), 1 / noonTangent(latitude_deg, AUGUST_1)]
    return Math.min(high, Math.max(low, rule))
  }
  const fraction = (rule: number, where: string, latitude_deg: number) =>
    check({
      ...common,
      id: `TRD-15/${where}`,
      title: `Overhang of ${rule.toFixed(2)} of the opening's height at ${where} N: nearest of what shades it whole at noon from 21 June to 1 August`,
      source: 'E. Mazria, as a design palette has it',
      unit: '1',
      expected: rule,
      tolerance: 0.05,
      computed: nearest(rule, latitude_deg),
      note: 'Tolerance: the rule is rounded to simple fractions.',
    })
  return [
    check({
      ...common,
      id: 'TRD-14/august',
      title:
        'Factors for full shade until 1 August, 28 to 56 N: largest deviation from the noon sun of 8 rows',
      source: 'E. Mazria, The Passive Solar Energy Book, 1979',
      provenance: 'from memory',
      unit: '1',
      expected: 0,
      tolerance: 0.1,
      computed: apart(AUGUST_1, (row) => row.low, 28),
    }),
    check({
      ...common,
      id: 'TRD-14/june',
      title: 'Factors for full shade on 21 June, 36 to 56 N: largest deviation from the noon sun of 6 rows',
      source: 'E. Mazria, The Passive Solar Energy Book, 1979',
      provenance: 'from memory',
      unit: '1',
      expected: 0,
      tolerance: 0.1,
      computed: apart(JUNE_21, (row) => row.high, 36),
      note: 'The rows for 28 and 32 N are left out: the book rounds an almost upright sun more boldly (11.1 for 12.6).',
    }),
    fraction(1 / 4, '30', 30),
    fraction(1 / 3, '38', 38),
    fraction(1 / 2, '50', 50),
  ]
}

/** Glass that faces 25 degrees off south, winter sun on the glass against glass to the south. */
function turnedGlass(inputs: EvidenceInputs): Check[] {
  const text = inputs.shared('climate/tmy3-725650.csv.gz')
  if (text === null) return []
  const climate = readTmy3(text)
  const sun = sunOfYear(climate.place)
  const ground = new Array<number>(12).fill(0.2)
  const winter_Whm2 = (faces_deg: number) => {
    const { beam_Wm2, sky_Wm2, ground_Wm2 } = planeIrradiance(
      climate,
      sun,
      { tilt_deg: 90, faces_deg },
      ground,
      [],
    )
    let sum = 0
    for (let hour = 0; hour < HOURS; hour++)
      if (hour < 59 * 24 || hour >= 304 * 24) sum += beam_Wm2[hour] + sky_Wm2[hour] + ground_Wm2[hour]
    return sum
  }
  const turned = 0.5 * (winter_Whm2(155) + winter_Whm2(205))
  return [
    check({
      ...common,
      id: 'TRD-12',
      title:
        'Glass 25 degrees off south loses about a tenth of the winter sun, November to February at Denver',
      source: 'Rule of thumb',
      unit: '%',
      expected: 10,
      tolerance: 5,
      computed: 100 * (1 - turned / winter_Whm2(180)),
      note: 'Mean of 25 degrees east and west. Tolerance: half of a rule given as "about".',
    }),
  ]
}
