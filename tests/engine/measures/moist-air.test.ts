import { expect, test } from 'vitest'
import psychrolib from 'psychrolib'
import {
  dewPoint,
  dewPointIso13788,
  humidityRatio,
  humidityRatioOfWetBulb,
  moistAirDensity,
  moistAirEnthalpy,
  moistAirVolume,
  saturationPressure,
  saturationPressureIso13788,
  standardPressure,
  vapourPressureOfRatio,
} from '#engine/measures/moist-air.ts'

psychrolib.SetUnitSystem(psychrolib.SI)

test('saturation pressure agrees with the published Hyland and Wexler values to 0.05 %', () => {
  const rows = [
    [-20, 103.26],
    [-10, 259.9],
    [0.01, 611.66],
    [10, 1228.0],
    [20, 2338.8],
    [25, 3169.2],
    [30, 4246.0],
    [40, 7383.5],
  ]
  for (const [t, expected] of rows) expect(Math.abs(saturationPressure(t) / expected - 1)).toBeLessThan(5e-4)
})

test('saturation pressure is that of the independent npm package psychrolib from -40 to 60 °C, to 1e-6', () => {
  for (let t = -40; t <= 60; t += 2.5) {
    if (t === 0) continue // ice or water there: the package changes at the triple point, 0.01 °C
    expect(Math.abs(saturationPressure(t) / psychrolib.GetSatVapPres(t) - 1)).toBeLessThan(1e-6)
  }
})

test('moist air volume, enthalpy and dew point are those of psychrolib over a grid of states', () => {
  for (const t of [-15, 2, 12, 25, 38])
    for (const humidity of [0.1, 0.5, 0.95])
      for (const pressure of [101325, 80000]) {
        const vapour = humidity * saturationPressure(t)
        const ratio = humidityRatio(vapour, pressure)
        expect(ratio).toBeCloseTo(psychrolib.GetHumRatioFromRelHum(t, humidity, pressure), 7)
        expect(moistAirEnthalpy(t, ratio)).toBeCloseTo(psychrolib.GetMoistAirEnthalpy(t, ratio) / 1000, 6)
        expect(moistAirVolume(t, ratio, pressure)).toBeCloseTo(
          psychrolib.GetMoistAirVolume(t, ratio, pressure),
          4,
        )
        expect(moistAirDensity(t, ratio, pressure)).toBeCloseTo(
          psychrolib.GetMoistAirDensity(t, ratio, pressure),
          4,
        )
        expect(dewPoint(vapour)).toBeCloseTo(psychrolib.GetTDewPointFromRelHum(t, humidity), 2)
      }
})

test('humidity from the wet bulb is that of psychrolib (ASHRAE Fundamentals ch. 1)', () => {
  for (const [dry, wet] of [
    [40, 20],
    [25, 18],
    [10, 9],
  ])
    expect(humidityRatioOfWetBulb(dry, wet, 101325)).toBeCloseTo(
      psychrolib.GetHumRatioFromTWetBulb(dry, wet, 101325),
      7,
    )
})

test('standard pressure is that of psychrolib at 0, 1,655 and 3,000 m', () => {
  for (const z of [0, 1655, 3000])
    expect(standardPressure(z) / psychrolib.GetStandardAtmPressure(z)).toBeCloseTo(1, 6)
})

test('ISO 13788 saturation pressures agree with its formula evaluated by hand to 0.1 Pa', () => {
  const rows = [
    [-10, 259.3],
    [-5, 401.2],
    [0, 610.5],
    [5, 871.9],
    [10, 1227.3],
    [15, 1704.4],
    [20, 2337.0],
    [25, 3165.9],
    [30, 4240.5],
  ]
  for (const [t, expected] of rows)
    expect(Math.abs(saturationPressureIso13788(t) - expected)).toBeLessThan(0.1)
})

test('dew points undo saturation pressures, over ice and over water', () => {
  for (let t = -30; t <= 45; t += 1.7) {
    expect(dewPoint(saturationPressure(t))).toBeCloseTo(t, 7)
    expect(dewPointIso13788(saturationPressureIso13788(t))).toBeCloseTo(t, 9)
  }
})

test('a vapour pressure comes back from its humidity ratio', () => {
  expect(vapourPressureOfRatio(humidityRatio(1450, 84000), 84000)).toBeCloseTo(1450, 9)
})

test('throws RangeError for the dew point of a vapour pressure that is not more than 0', () => {
  expect(() => dewPoint(0)).toThrow(RangeError)
  expect(() => dewPointIso13788(-5)).toThrow(RangeError)
  expect(() => dewPointIso13788(NaN)).toThrow(RangeError)
})
