import { hourName } from './calendar.ts'
import { ClimateFileError } from './climate-file-error.ts'
import { HOURS, type ClimatePlace } from './climate-year.ts'
import { extraterrestrialNormal, sinElevation } from './solar-day.ts'

/** What a quantity is called in messages, its unit, and the values that weather can have. */
export interface Quantity {
  readonly name: string
  readonly unit: string
  readonly low: number
  readonly high: number
}

/**
 * Wider than anything measured (-89.2 °C at Vostok, 56.7 °C in Death Valley, dew point 35 °C, 1,085 hPa), so
 * that what falls outside is a fault of the file. Radiation: an hour under broken cloud can exceed the clear
 * sky, but not the solar constant by more than a tenth.
 */
export const QUANTITIES = {
  outdoor: { name: 'outdoor temperature', unit: '°C', low: -90, high: 60 },
  dewPoint: { name: 'dew point', unit: '°C', low: -100, high: 40 },
  humidity: { name: 'relative humidity', unit: '%', low: 0, high: 105 },
  global: { name: 'global radiation', unit: 'W/m²', low: 0, high: 1500 },
  beam: { name: 'beam radiation', unit: 'W/m²', low: 0, high: 1500 },
  diffuse: { name: 'diffuse radiation', unit: 'W/m²', low: 0, high: 1000 },
  wind: { name: 'wind speed', unit: 'm/s', low: 0, high: 75 },
  pressure: { name: 'pressure', unit: 'Pa', low: 40000, high: 110000 },
  cloud: { name: 'cloud cover', unit: '%', low: 0, high: 100 },
  skyRadiation: { name: 'sky radiation', unit: 'W/m²', low: 50, high: 600 },
  skyTemperature: { name: 'sky temperature', unit: '°C', low: -120, high: 60 },
} as const satisfies Record<string, Quantity>

const SENTINELS = [99.9, 999, 999.9, 999.99, 9999, 99999, 77777, 88888, 999999, 9900]

/**
 * One value, checked against what weather can have.
 *
 * @param value in the unit of the quantity
 * @param line  of the file, for the message
 * @param raw   the value as the file has it, before its unit was converted
 */
export function plausible(quantity: Quantity, value: number, line: number, raw = value): number {
  if (value >= quantity.low && value <= quantity.high) return value
  const shown = `the ${quantity.name} is ${Number(value.toPrecision(7))} ${quantity.unit}`
  if (SENTINELS.some((mark) => Math.abs(Math.abs(raw) - mark) < 1e-6)) {
    throw new ClimateFileError(
      line,
      `the ${quantity.name} is ${raw}, a mark for a missing value. Fill the gap or take another year.`,
    )
  }
  throw new ClimateFileError(
    line,
    `${shown}; possible are ${quantity.low} to ${quantity.high} ${quantity.unit}. Check the value and the unit of the column.`,
  )
}

/** A number from a cell of a file, not yet checked. */
export function cellNumber(cell: string | undefined, name: string, line: number): number {
  if (cell === undefined || cell === '') {
    throw new ClimateFileError(line, `the ${name} is missing. Fill the gap or take another year.`)
  }
  const value = Number(cell)
  if (!Number.isFinite(value)) {
    throw new ClimateFileError(line, `the ${name} is '${cell.slice(0, 30)}', not a number. Correct it.`)
  }
  return value
}

const TWILIGHT_SIN = Math.sin((-6 * Math.PI) / 180)

/** Arrays whose values must fit each other. */
export interface TogetherInputs {
  readonly place: ClimatePlace
  readonly outdoor_C: Float64Array
  readonly dewPoint_C: Float64Array
  readonly global_Wm2: Float64Array
  readonly beam_Wm2: Float64Array | null
}

/**
 * Checks what no single value shows: dew point above the air by more than 1 K, sun in the night, more beam
 * than there is outside the atmosphere.
 *
 * @param lines line of the file for each hour
 */
export function checkTogether(year: TogetherInputs, lines: readonly number[]): void {
  const { outdoor_C, dewPoint_C, global_Wm2, beam_Wm2 } = year
  for (let i = 0; i < HOURS; i++) {
    if (dewPoint_C[i] > outdoor_C[i] + 1) {
      throw new ClimateFileError(
        lines[i],
        `the dew point ${round(dewPoint_C[i])} °C is above the air at ${round(outdoor_C[i])} °C. Check columns and units.`,
      )
    }
    if (global_Wm2[i] > 20 || (beam_Wm2 !== null && beam_Wm2[i] > 20)) checkNight(year, i, lines[i])
    if (beam_Wm2 !== null) {
      // 1 % and 5 W/m2 of room: files use solar constants of 1353 to 1377 W/m2
      const limit = extraterrestrialNormal(Math.floor(i / 24)) * 1.01 + 5
      if (beam_Wm2[i] > limit) {
        throw new ClimateFileError(
          lines[i],
          `the beam radiation ${round(beam_Wm2[i])} W/m² is more than the sun sends, ${round(limit)} W/m². Check the unit.`,
        )
      }
    }
  }
  if (global_Wm2.every((value) => value === 0)) {
    throw new ClimateFileError(null, 'the global radiation is 0 all year. Check the column.')
  }
}

function checkNight({ place, global_Wm2, beam_Wm2 }: TogetherInputs, i: number, line: number): void {
  const highest = Math.max(sinElevation(place, i), sinElevation(place, i + 0.5), sinElevation(place, i + 1))
  if (highest >= TWILIGHT_SIN) return
  const sun_Wm2 = Math.max(global_Wm2[i], beam_Wm2?.[i] ?? 0)
  throw new ClimateFileError(
    line,
    `${round(sun_Wm2)} W/m² of sun at ${hourName(i)} although the sun is far below the horizon at ${place.latitude_deg}°, ${place.longitude_deg}°. Check time zone, longitude and the order of the hours.`,
  )
}

function round(value: number): number {
  return Math.round(value * 10) / 10
}
