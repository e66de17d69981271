/** Spellings of a unit and how its values become the unit of the engine. */
type Conversion = readonly [spellings: string, toSI: (value: number) => number]

const same = (value: number): number => value
const times =
  (factor: number) =>
  (value: number): number =>
    value * factor

const TEMPERATURE: readonly Conversion[] = [
  ['°c c degc', same],
  ['°f f degf', (value) => (value - 32) / 1.8],
  ['k', (value) => value - 273.15],
]

/** By unit of the engine: spellings that a header may use. Energies are sums over the hour. */
const CONVERSIONS: Readonly<Record<string, readonly Conversion[]>> = {
  '°C': TEMPERATURE,
  'W/m²': [
    ['w/m² w/m2 w/m^2 wm-2 wh/m² wh/m2 wh/m^2', same],
    ['kw/m² kw/m2 kw/m^2 kwh/m² kwh/m2 kwh/m^2', times(1000)],
    ['kj/m² kj/m2 kj/m^2', times(1 / 3.6)],
    ['mj/m² mj/m2 mj/m^2', times(1000 / 3.6)],
    ['btu/ft² btu/ft2 btu/ft^2 btu/hft²', times(3.154591)],
  ],
  '%': [
    ['% percent pct', same],
    ['1 fraction', times(100)],
    ['tenths', times(10)],
    ['oktas', times(12.5)],
  ],
  'm/s': [
    ['m/s ms-1', same],
    ['km/h kmh', times(1 / 3.6)],
    ['mph', times(0.44704)],
    ['kn kt knots', times(1852 / 3600)],
  ],
  Pa: [
    ['pa', same],
    ['hpa mbar mb', times(100)],
    ['kpa', times(1000)],
    ['inhg', times(3386.389)],
  ],
}

/**
 * Function that turns values in a spelt unit into the engine's unit; null for a unit nobody knows.
 *
 * @param spelling as in a file, `°F`; letter case and spaces do not matter
 * @param unit     of the engine: °C, W/m², %, m/s, Pa
 */
export function unitConverter(spelling: string, unit: string): ((value: number) => number) | null {
  const wanted = spelling.toLowerCase().replace(/\s/g, '')
  const found = CONVERSIONS[unit]?.find(([spellings]) => spellings.split(' ').includes(wanted))
  return found?.[1] ?? null
}
