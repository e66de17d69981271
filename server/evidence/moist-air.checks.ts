import psychrolib from 'psychrolib'
import { minimumSurface, temperatureFactor } from '#engine/measures/damp.ts'
import {
  dewPoint,
  dewPointIso13788,
  humidityRatio,
  humidityRatioOfWetBulb,
  moistAirEnthalpy,
  moistAirVolume,
  saturationPressure,
  saturationPressureIso13788,
  standardPressure,
  vapourPressureOfRatio,
} from '#engine/measures/moist-air.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'

const SEA_LEVEL_PA = 101325

/** Saturation, dew point, mixtures of air and vapour, humidity at surfaces. */
export const moistAirChecks: CheckGroup = {
  topic: 'Moist air and damp surfaces',
  run: (inputs) => [...saturation(inputs), ...dewPoints(), ...example(), ...independent(), ...surfaces()],
}

function saturation(inputs: EvidenceInputs): Check[] {
  const rows = inputs.published('saturation-pressure.csv')
  const each = rows.map(({ form, temperature_C, pressure_Pa }) => {
    const isIso = form === 'iso13788'
    const t = Number(temperature_C)
    const expected = Number(pressure_Pa)
    return check({
      id: `${isIso ? 'PSY-02' : 'PSY-01'}/${temperature_C}`,
      title: `Saturation pressure at ${temperature_C} °C`,
      source: isIso
        ? 'ISO 13788:2012, annex E'
        : 'Hyland and Wexler 1983; ASHRAE Handbook Fundamentals, chapter 1',
      provenance: 'derived',
      unit: 'Pa',
      expected,
      tolerance: isIso ? 0.1 : 5e-4 * expected,
      computed: isIso ? saturationPressureIso13788(t) : saturationPressure(t),
    })
  })
  let apart_K = 0
  for (let t = -20; t <= 40; t += 0.5)
    apart_K = Math.max(apart_K, Math.abs(dewPointIso13788(saturationPressure(t)) - t))
  return [
    ...each,
    check({
      id: 'PSY-02/forms',
      title: 'Largest difference of dew points by ISO 13788 and by Hyland and Wexler, -20 to 40 °C',
      source: 'ISO 13788:2012, annex E, against Hyland and Wexler 1983',
      provenance: 'derived',
      unit: 'K',
      expected: 0,
      tolerance: 0.1,
      computed: apart_K,
      note: 'The short form is a fit. Climate files give dew points to 0.1 K.',
    }),
  ]
}

function dewPoints(): Check[] {
  const source = 'ASHRAE Handbook Fundamentals, chapter 1 (equations)'
  const dew = [
    [20, 50, 9.27],
    [20, 60, 12.0],
    [25, 50, 13.86],
    [22, 40, 7.79],
  ].flatMap(([t, humidity, expected]) =>
    [
      { form: 'ashrae', computed: dewPoint((humidity / 100) * saturationPressure(t)) },
      { form: 'iso', computed: dewPointIso13788((humidity / 100) * saturationPressureIso13788(t)) },
    ].map(({ form, computed }) =>
      check({
        id: `PSY-03/dew/${t}-${humidity}/${form}`,
        title: `Dew point of ${t} °C at ${humidity} %${form === 'iso' ? ', ISO 13788 form' : ''}`,
        source: form === 'iso' ? 'ISO 13788:2012, annex E' : source,
        provenance: 'derived',
        unit: '°C',
        expected,
        tolerance: 0.02,
        computed,
      }),
    ),
  )
  const ratio = (t: number, humidity: number) =>
    humidityRatio((humidity / 100) * saturationPressure(t), SEA_LEVEL_PA)
  const ratios = [
    [20, 0.007262],
    [25, 0.009881],
    [30, 0.01331],
  ].map(([t, expected]) =>
    check({
      id: `PSY-03/ratio/${t}-50`,
      title: `Humidity ratio of ${t} °C at 50 %`,
      source,
      provenance: 'derived',
      unit: 'g/kg',
      expected: 1000 * expected,
      tolerance: 0.006,
      computed: 1000 * ratio(t, 50),
      note: 'Given to four places.',
    }),
  )
  const enthalpy = check({
    id: 'PSY-03/enthalpy/25-50',
    title: 'Enthalpy of 25 °C at 50 %',
    source,
    provenance: 'derived',
    unit: 'kJ/kg',
    expected: 50.32,
    tolerance: 0.02,
    computed: moistAirEnthalpy(25, ratio(25, 50)),
  })
  return [...dew, ...ratios, enthalpy]
}

/** ASHRAE's example of 40 °C dry bulb and 20 °C wet bulb: by the book's equations, and as the book reads its chart. */
function example(): Check[] {
  const ratio = humidityRatioOfWetBulb(40, 20, SEA_LEVEL_PA)
  const vapour = vapourPressureOfRatio(ratio, SEA_LEVEL_PA)
  const found = {
    ratio: { unit: 'g/kg', computed: 1000 * ratio, equation: 6.4, chart: 6.5 },
    dew: { unit: '°C', computed: dewPoint(vapour), equation: 7.43, chart: null },
    humidity: { unit: '%', computed: (100 * vapour) / saturationPressure(40), equation: 13.98, chart: 14 },
    enthalpy: { unit: 'kJ/kg', computed: moistAirEnthalpy(40, ratio), equation: 56.72, chart: 56.7 },
    volume: {
      unit: 'm³/kg',
      computed: moistAirVolume(40, ratio, SEA_LEVEL_PA),
      equation: 0.8963,
      chart: 0.896,
    },
  }
  return Object.entries(found).flatMap(([name, { unit, computed, equation, chart }]) => {
    const row = { title: `Moist air of 40 °C dry and 20 °C wet bulb: ${name}`, unit, computed }
    const source = 'ASHRAE Handbook Fundamentals, chapter 1, example 1'
    const byEquation = check({
      ...row,
      id: `PSY-04/${name}/equation`,
      source: `${source}, by its equations`,
      provenance: 'derived',
      expected: equation,
      tolerance: 0.02 * equation,
    })
    if (chart === null) return [byEquation]
    const byChart = check({
      ...row,
      id: `PSY-04/${name}/chart`,
      source: `${source}, read off the chart`,
      provenance: 'from memory',
      expected: chart,
      tolerance: 0.02 * chart,
      note: 'Reading a chart. Its dew point, read as 7 °C, is left to the equation.',
    })
    return [byEquation, byChart]
  })
}

/** Against the npm package psychrolib, an independent program of the same chapter. */
function independent(): Check[] {
  psychrolib.SetUnitSystem(psychrolib.SI)
  const deviation = { saturation: 0, ratio: 0, enthalpy: 0, volume: 0, dew: 0, wetBulb: 0, altitude: 0 }
  const widen = (name: keyof typeof deviation, value: number) => {
    // A value that is not a number must show, so no Math.max here.
    if (!(Math.abs(value) <= deviation[name])) deviation[name] = Math.abs(value)
  }
  for (let t = -30.5; t <= 45; t += 2.5) {
    widen('saturation', saturationPressure(t) / psychrolib.GetSatVapPres(t) - 1)
    for (const humidity of [0.1, 0.4, 0.7, 0.95])
      for (const pressure of [SEA_LEVEL_PA, 83000]) {
        const vapour = humidity * saturationPressure(t)
        const ratio = humidityRatio(vapour, pressure)
        widen('ratio', ratio / psychrolib.GetHumRatioFromRelHum(t, humidity, pressure) - 1)
        widen('enthalpy', moistAirEnthalpy(t, ratio) - psychrolib.GetMoistAirEnthalpy(t, ratio) / 1000)
        widen(
          'volume',
          moistAirVolume(t, ratio, pressure) / psychrolib.GetMoistAirVolume(t, ratio, pressure) - 1,
        )
        widen('dew', dewPoint(vapour) - psychrolib.GetTDewPointFromRelHum(t, humidity))
      }
  }
  for (let wet = 1; wet <= 30; wet += 1)
    widen(
      'wetBulb',
      humidityRatioOfWetBulb(wet + 4, wet, SEA_LEVEL_PA) /
        psychrolib.GetHumRatioFromTWetBulb(wet + 4, wet, SEA_LEVEL_PA) -
        1,
    )
  for (let z = 0; z <= 4000; z += 250)
    widen('altitude', standardPressure(z) / psychrolib.GetStandardAtmPressure(z) - 1)
  const rows: [keyof typeof deviation, string, string, number, number][] = [
    ['saturation', 'saturation pressure, -30 to 45 °C', '%', 100, 0.001],
    ['ratio', 'humidity ratio', '%', 100, 0.01],
    ['enthalpy', 'enthalpy', 'kJ/kg', 1, 0.001],
    ['volume', 'specific volume', '%', 100, 0.01],
    ['dew', 'dew point', 'K', 1, 0.005],
    ['wetBulb', 'humidity ratio from the wet bulb, 1 to 30 °C', '%', 100, 0.01],
    ['altitude', 'standard pressure, 0 to 4,000 m', '%', 100, 0.01],
  ]
  return rows.map(([name, what, unit, scale, tolerance]) =>
    check({
      id: `PSY-05/${name}`,
      title: `Largest deviation from psychrolib: ${what}`,
      source: 'npm package psychrolib 1.1.1 (ASHRAE Handbook Fundamentals 2017, chapter 1)',
      provenance: 'looked up',
      unit,
      expected: 0,
      tolerance,
      computed: scale * deviation[name],
      note: 'Run beside the engine, not copied. It finds dew points to 0.001 K.',
    }),
  )
}

function surfaces(): Check[] {
  const surface_C = minimumSurface(0.5 * saturationPressureIso13788(20))
  const derived = { provenance: 'derived', source: 'ISO 13788:2012, clause 5' } as const
  const din = { provenance: 'looked up', source: 'DIN 4108-2, as quoted in trade literature' } as const
  const coldest = temperatureFactor(surface_C, 20, -5) ?? NaN
  return [
    check({
      ...derived,
      id: 'CON-01/surface',
      title: 'Lowest surface temperature that keeps 80 % beside 20 °C at 50 %',
      unit: '°C',
      expected: 12.62,
      tolerance: 0.02,
      computed: surface_C,
    }),
    check({
      ...derived,
      id: 'CON-01/fRsi/-5',
      title: 'Least temperature factor at -5 °C outdoors',
      unit: '-',
      expected: 0.705,
      tolerance: 0.001,
      computed: coldest,
    }),
    check({
      ...derived,
      id: 'CON-01/fRsi/0',
      title: 'Least temperature factor at 0 °C outdoors',
      unit: '-',
      expected: 0.631,
      tolerance: 0.001,
      computed: temperatureFactor(surface_C, 20, 0) ?? NaN,
    }),
    check({
      ...din,
      id: 'CON-01/surface/din',
      title: 'Lowest surface temperature beside 20 °C at 50 %, rounded',
      unit: '°C',
      expected: 12.6,
      tolerance: 0.05,
      computed: surface_C,
      note: 'Stated to one place.',
    }),
    check({
      ...din,
      id: 'CON-01/fRsi/din',
      title: 'Least temperature factor at -5 °C outdoors, rounded',
      unit: '-',
      expected: 0.7,
      tolerance: 0.01,
      computed: coldest,
      note: 'Stated to two places.',
    }),
  ]
}
