import { erbsDiffuseShare } from '#engine/climate/beam.ts'
import { bendtExponent, clearnessRange, herzogExponent } from '#engine/climate/clearness.ts'
import type { ClimateYear } from '#engine/climate/climate-year.ts'
import { dailyMeans } from '#engine/climate/day-values.ts'
import { hourShare } from '#engine/climate/day-profile.ts'
import { generateYear } from '#engine/climate/generate-year.ts'
import { undisturbedGround } from '#engine/climate/ground.ts'
import { firstHarmonic } from '#engine/climate/harmonic.ts'
import { dewPointFromHumidity } from '#engine/climate/humidity.ts'
import { monthMeans } from '#engine/climate/month-curve.ts'
import { hourlyCloud, skyRadiation, skyTemperatures } from '#engine/climate/sky.ts'
import type { MonthlyNormals } from '#engine/climate/normals.ts'
import { sunHours } from '#engine/climate/solar-day.ts'
import { readTmy3 } from '#engine/climate/tmy3.ts'
import { normalsOf, yearStatistics } from '#engine/climate/year-statistics.ts'
import { BUILT_IN_SEED } from '../climates/library.ts'
import { parseNormals } from '../climates/normals-file.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import type { EvidenceInputs } from './check.ts'

/** Formulas of the sun and of the clearness of days, against values worked out elsewhere. */
export const sunFormulas: CheckGroup = {
  topic: 'climate: radiation formulas',
  run: (inputs) => [...erbs(inputs), ...dayProfile(), ...bendt(inputs)],
}

/** Undisturbed ground temperature. */
export const undisturbed: CheckGroup = {
  topic: 'climate: undisturbed ground',
  run: (inputs) => [...kusuda(inputs), ...fargo()],
}

/** Generated years against their own monthly normals. */
export const normalsKept: CheckGroup = { topic: 'climate: monthly normals', run: closures }

/** Generated years against measured ones. */
export const likeReal: CheckGroup = {
  topic: 'climate: generated against measured years',
  run: (inputs) => {
    const rows = STATIONS.map((station) => ({
      station,
      text: inputs.shared(`climate/tmy3-${station.number}.csv.gz`),
    }))
    if (rows.some(({ text }) => text === null)) {
      return { leftOut: 'the shared folder with the measured years is missing' }
    }
    return rows.flatMap(({ station, text }) => compared(inputs, station, readTmy3(text as string)))
  },
}

/** Long-wave radiation of the sky against a year of a weather reanalysis. */
export const longWave: CheckGroup = {
  topic: 'climate: long-wave radiation of the sky',
  run: (inputs) => {
    const text = inputs.shared('climate/pvgis-tmy-45N-8E.json.gz')
    return text === null
      ? { leftOut: 'the shared folder with the measured year is missing' }
      : skyChecks(text)
  },
}

export const climateChecks: readonly CheckGroup[] = [
  sunFormulas,
  undisturbed,
  normalsKept,
  likeReal,
  longWave,
]

function erbs(inputs: EvidenceInputs): Check[] {
  return inputs.published('climate-erbs-1982.csv').map((row) =>
    check({
      id: `TRN-01/erbs/kt-${row.kt}`,
      title: `diffuse share of hourly global radiation at clearness ${row.kt}`,
      source: 'Erbs, Klein and Duffie, Solar Energy 28(4), 1982',
      provenance: 'derived',
      unit: '1',
      expected: Number(row.diffuse_share),
      tolerance: 1e-4,
      computed: erbsDiffuseShare(Number(row.kt)),
      note: 'coefficients looked up; the value is worked out from them and rounded to four places',
    }),
  )
}

/** The hourly shares of one day add up to the day. */
function dayProfile(): Check[] {
  return [60, 75, 90, 105, 120].map((sunset_deg) => {
    const sunset = (sunset_deg * Math.PI) / 180
    let sum = 0
    const steps = 2400
    for (let k = 0; k < steps; k++) {
      sum += hourShare(-Math.PI + (2 * Math.PI * (k + 0.5)) / steps, sunset) * (24 / steps)
    }
    return check({
      id: `CLI-01/sunset-${sunset_deg}`,
      title: `hourly shares of a day with sunset at ${sunset_deg}° add up to the day`,
      source: 'Collares-Pereira and Rabl, Solar Energy 22, 1979',
      provenance: 'looked up',
      unit: '1',
      expected: 1,
      tolerance: 0.02,
      computed: sum,
      note: 'the printed coefficients close to about 1 %; the generator scales each day to its sum',
    })
  })
}

function bendt(inputs: EvidenceInputs): Check[] {
  return inputs.published('climate-bendt-1981.csv').flatMap((row) => {
    const mean = Number(row.clearness)
    const range = clearnessRange(mean)
    const common = {
      source: 'Bendt, Collares-Pereira and Rabl, Solar Energy 27, 1981; Herzog 1985',
      provenance: 'derived',
      unit: '1',
    } as const
    return [
      check({
        ...common,
        id: `CLI-02/KT-${row.clearness}`,
        title: `exponent of the distribution of days at monthly clearness ${row.clearness}`,
        expected: Number(row.exponent),
        tolerance: 0.006,
        computed: bendtExponent(mean, range),
        note: 'half of the last printed place, and a little for the rounding of the highest clearness',
      }),
      check({
        ...common,
        id: `CLI-03/KT-${row.clearness}`,
        title: `the same by the explicit fit of Herzog, monthly clearness ${row.clearness}`,
        expected: Number(row.herzog),
        tolerance: 0.006,
        computed: herzogExponent(mean, range),
      }),
    ]
  })
}

function kusuda(inputs: EvidenceInputs): Check[] {
  const DAY_S = 86400
  const wave = { mean_C: 11.7, amplitude_K: 10.6, coldest_s: 35 * DAY_S, diffusivity_m2s: 0.05 / DAY_S }
  return inputs.published('climate-kusuda-1965.csv').map((row) =>
    check({
      id: `GND-07/${row.depth_m}m/day-${row.day}`,
      title: `undisturbed ground at ${row.depth_m} m on day ${row.day}`,
      source: 'Kusuda and Achenbach, ASHRAE Transactions 71(1), 1965',
      provenance: 'derived',
      unit: '°C',
      expected: Number(row.temperature_C),
      tolerance: 1e-3,
      computed: undisturbedGround(wave, Float64Array.of(Number(row.depth_m)), Number(row.day) * DAY_S)[0],
    }),
  )
}

/** Soil at Fargo, anchored at 50 cm: the wave at depth against harmonics fitted to four measured years. */
function fargo(): Check[] {
  const DAY_S = 86400
  const anchor = { mean_C: 7.8, amplitude_K: 10.35, coldest_s: 40.9 * DAY_S, diffusivity_m2s: 3.6e-7 }
  const fitted = [
    { depth_cm: 100, amplitude_K: 7.82, coldest_day: 58.2 },
    { depth_cm: 150, amplitude_K: 6.11, coldest_day: 73.2 },
    { depth_cm: 200, amplitude_K: 4.78, coldest_day: 87.2 },
  ]
  const common = {
    source: 'soil at Fargo, North Dakota, 2014-2018: yearly harmonics fitted to the measured hours',
    provenance: 'derived',
  } as const
  return fitted.flatMap(({ depth_cm, amplitude_K, coldest_day }) => {
    const below = Float64Array.of(depth_cm / 100 - 0.5)
    const year = Float64Array.from(
      { length: 8760 },
      (_, i) => undisturbedGround(anchor, below, (i + 1) * 3600)[0],
    )
    const found = firstHarmonic(year)
    return [
      check({
        ...common,
        id: `CLI-04/${depth_cm}cm/amplitude`,
        title: `amplitude at ${depth_cm} cm from the wave at 50 cm`,
        unit: 'K',
        expected: amplitude_K,
        tolerance: 0.5,
        computed: found.amplitude,
        note: 'diffusivity 3.6e-7 m²/s; soil that freezes in winter is not uniform',
      }),
      check({
        ...common,
        id: `CLI-04/${depth_cm}cm/coldest`,
        title: `day of the coldest at ${depth_cm} cm from the wave at 50 cm`,
        unit: 'd',
        expected: coldest_day,
        tolerance: 3,
        computed: found.coldest_s / DAY_S,
      }),
    ]
  })
}

function closures(inputs: EvidenceInputs): Check[] {
  const deviations = parseNormals(inputs.data('climates/normals.json')).map((place) => {
    const { normals } = place
    const year = generateYear(normals, BUILT_IN_SEED)
    const temperature_C = monthMeans(dailyMeans(year.outdoor_C))
    const radiation = monthMeans(dailyMeans(year.global_Wm2)).map((value) => value * 0.024)
    const furthest_K = Math.max(...temperature_C.map((value, m) => Math.abs(value - normals.mean_C[m])))
    const furthest_share = beamShareDeviation(normals, year)
    const furthest_pct = Math.max(
      ...radiation.map((value, m) => {
        const wanted = normals.global_kWhm2day[m]
        return wanted === 0 ? 100 * value : 100 * Math.abs(value / wanted - 1)
      }),
    )
    return { place, furthest_K, furthest_pct, furthest_share }
  })
  const rows = (id: string, title: string, source: string, kelvin: number, percent: number): Check[] => {
    const common = { source, provenance: 'looked up', expected: 0 } as const
    return [
      check({
        ...common,
        id: `CLI-05/${id}/temperature`,
        title: `${title}: largest deviation of monthly mean temperatures from the normals`,
        unit: 'K',
        tolerance: 0.2,
        computed: kelvin,
      }),
      check({
        ...common,
        id: `CLI-05/${id}/radiation`,
        title: `${title}: largest deviation of monthly global radiation from the normals`,
        unit: '%',
        tolerance: 2,
        computed: percent,
      }),
    ]
  }
  // polar night, time zones of 5.75 and 9.5 h, the southern tropics at 3,459 m, a station with a measured year
  const telling = ['tromso', 'kathmandu', 'alice-springs', 'la-quiaca', 'denver']
  return [
    ...deviations
      .filter(({ place }) => telling.includes(place.id))
      .flatMap(({ place, furthest_K, furthest_pct }) =>
        rows(place.id, place.name, place.normals.source, furthest_K, furthest_pct),
      ),
    ...rows(
      'all',
      `${deviations.length} built-in places, 12 months each`,
      'monthly normals of data/climates/normals.json, sources there',
      Math.max(...deviations.map(({ furthest_K }) => furthest_K)),
      Math.max(...deviations.map(({ furthest_pct }) => furthest_pct)),
    ),
    check({
      id: 'CLI-05/all/beam',
      title:
        'places with known diffuse radiation, months above 0.5 kWh/(m² day): largest deviation of the share of beam',
      source: 'monthly sums of TMY3 files, data/climates/normals.json',
      provenance: 'looked up',
      unit: '1',
      expected: 0,
      tolerance: 0.02,
      computed: Math.max(...deviations.map(({ furthest_share }) => furthest_share)),
    }),
  ]
}

/**
 * Largest deviation of a month's share of beam from the normals; 0 where these do not say. Months below
 * 0.5 kWh/(m² day) are left out: normals of two decimals say too little about a share there.
 */
function beamShareDeviation(normals: MonthlyNormals, year: ClimateYear): number {
  const wanted = normals.diffuse_kWhm2day
  if (wanted === undefined) return 0
  const shares = yearStatistics(year).monthBeamShares
  return Math.max(
    ...shares.map((share, m) =>
      normals.global_kWhm2day[m] < 0.5 ? 0 : Math.abs(share - 1 + wanted[m] / normals.global_kWhm2day[m]),
    ),
  )
}

interface Station {
  readonly number: string
  readonly name: string
  /** Built-in place of the same station; null where the normals are those of the measured year itself. */
  readonly builtIn: string | null
}

const STATIONS: readonly Station[] = [
  { number: '725650', name: 'Denver', builtIn: 'denver' },
  { number: '726580', name: 'Minneapolis', builtIn: 'minneapolis' },
  { number: '723650', name: 'Albuquerque', builtIn: null },
  { number: '726930', name: 'Eugene', builtIn: null },
]

const SEASONS = [
  { name: 'winter', months: [11, 0, 1] },
  { name: 'spring', months: [2, 3, 4] },
  { name: 'summer', months: [5, 6, 7] },
  { name: 'autumn', months: [8, 9, 10] },
] as const

function compared(inputs: EvidenceInputs, station: Station, measured: ClimateYear): Check[] {
  const own = normalsOf(measured)
  const place = parseNormals(inputs.data('climates/normals.json')).find(({ id }) => id === station.builtIn)
  // the beam model alone, without the known diffuse radiation
  const normals = { ...(place?.normals ?? own), diffuse_kWhm2day: undefined }
  const real = yearStatistics(measured)
  const generated = generateYear(normals, BUILT_IN_SEED)
  const made = yearStatistics(generated)
  const row = (
    what: string,
    title: string,
    unit: string,
    values: readonly [real: number, made: number],
    tolerance: number,
    note?: string,
  ): Check =>
    check({
      id: `CLI-06/${station.name.toLowerCase()}/${what}`,
      title: `${station.name}: ${title}`,
      source: `measured typical year TMY3 ${station.number}`,
      provenance: 'derived',
      unit,
      expected: values[0],
      tolerance,
      computed: values[1],
      note,
    })
  const season = (values: Float64Array, months: readonly number[]): number =>
    months.reduce((sum, month) => sum + values[month] / months.length, 0)
  const beamOver = (year: ClimateYear, months: readonly number[]): number => {
    const inMonths = (values: Float64Array): number => season(monthMeans(dailyMeans(values)), months)
    return 1 - inMonths(year.diffuse_Wm2) / inMonths(year.global_Wm2)
  }
  const byRule = yearStatistics(generateYear({ ...own, daySpread_K: undefined }, BUILT_IN_SEED))
  return [
    row(
      'spread',
      'spread of daily mean temperatures, year',
      'K',
      [real.spread_K, made.spread_K],
      0.2 * real.spread_K,
      place === undefined
        ? '20 %; the spread of the measured year is among the normals'
        : '20 %; the spread comes from the rule, without the measured year',
    ),
    ...SEASONS.map(({ name, months }) => ({
      ...row(
        `spread/${name}`,
        `spread of daily mean temperatures, ${name}`,
        'K',
        [season(real.monthSpreads_K, months), season(made.monthSpreads_K, months)],
        0.35 * season(real.monthSpreads_K, months),
        'two standard errors of 91 days that persist by 0.66, measured and generated, are 33 %; each season of a typical year is three single months',
      ),
      weight: 'soft' as const,
    })),
    {
      ...row(
        'spread/rule',
        'spread of daily mean temperatures by the rule alone',
        'K',
        [real.spread_K, byRule.spread_K],
        0.2 * real.spread_K,
        'the rule fits 29 stations of one real year to 12 % rms; typical years are put together of calm months, and Albuquerque is calmer than its neighbours',
      ),
      weight: 'soft',
    },
    row('beam', 'share of beam in global radiation, year', '1', [real.beamShare, made.beamShare], 0.05),
    ...SEASONS.map(({ name, months }) =>
      row(
        `beam/${name}`,
        `share of beam in global radiation, ${name}`,
        '1',
        [beamOver(measured, months), beamOver(generated, months)],
        0.08,
        'the single months of a typical year differ by up to 0.1 at the same clearness',
      ),
    ),
    row(
      'range',
      'mean daily range of temperature',
      'K',
      [real.range_K, made.range_K],
      0.3,
      'the normal itself, reached by narrowing the wave of the sun',
    ),
    row(
      'range-spread',
      'spread of the daily range',
      'K',
      [real.rangeSpread_K, made.rangeSpread_K],
      0.3 * real.rangeSpread_K,
      '30 %: cloudy and clear days differ more in humid places than one factor says',
    ),
    row(
      'persistence',
      'correlation of daily mean temperature with the day before',
      '1',
      [real.persistence, made.persistence],
      0.15,
      'one number serves all places; single years vary by ±0.05',
    ),
    row(
      'clearness',
      'spread of daily clearness',
      '1',
      [real.clearnessSpread, made.clearnessSpread],
      0.2 * real.clearnessSpread,
      '20 %: the distribution of Bendt is known to be a little wide',
    ),
  ]
}

interface ReanalysisHour {
  readonly T2m: number
  readonly RH: number
  readonly 'G(h)': number
  readonly 'IR(h)': number
  readonly SP: number
}

function skyChecks(text: string): Check[] {
  const { inputs, outputs } = JSON.parse(text) as {
    readonly inputs: { readonly location: Readonly<Record<string, number>> }
    readonly outputs: { readonly tmy_hourly: readonly ReanalysisHour[] }
  }
  const hours = outputs.tmy_hourly
  const column = (read: (hour: ReanalysisHour) => number): Float64Array => Float64Array.from(hours, read)
  const { latitude, longitude, elevation } = inputs.location
  const place = {
    name: '45 N 8 E',
    latitude_deg: latitude,
    longitude_deg: longitude,
    elevation_m: elevation,
    timeZone_h: 0,
  }
  const outdoor_C = column((hour) => hour.T2m)
  const dewPoint_C = column((hour) => dewPointFromHumidity(hour.T2m, hour.RH))
  const cloud = hourlyCloud(
    column((hour) => hour['G(h)']),
    sunHours(place).outside_Wm2,
  )
  const pressure_Pa = column((hour) => hour.SP)
  const sky_C = skyTemperatures({ outdoor_C, dewPoint_C, pressure_Pa, cloud })
  const errors = sky_C.map((value, i) => skyRadiation(value) - hours[i]['IR(h)'])
  const common = {
    source:
      'PVGIS typical year (European Union), long-wave radiation of ERA5, Berdahl and Martin 1984 with cloud',
    provenance: 'derived',
    unit: 'W/m²',
    expected: 0,
  } as const
  return [
    check({
      ...common,
      id: 'CLI-07/mean',
      title: 'mean deviation of the sky long-wave radiation, 8,760 hours at 45 N 8 E',
      tolerance: 5,
      computed: errors.reduce((sum, value) => sum + value, 0) / errors.length,
      note: '5 W/m² is about 1 K of sky temperature',
    }),
    check({
      ...common,
      id: 'CLI-07/rms',
      title: 'root mean square deviation of the same',
      tolerance: 22,
      computed: Math.sqrt(errors.reduce((sum, value) => sum + value * value, 0) / errors.length),
      note: 'clouds are guessed from one number a day; an independent computation of the same formulas gave 19',
    }),
  ]
}
