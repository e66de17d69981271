import { MONTH_DAYS } from '#engine/climate/calendar.ts'
import type { ClimatePlace } from '#engine/climate/climate-year.ts'
import { sunHours } from '#engine/climate/solar-day.ts'

export const PLACE: ClimatePlace = {
  name: 'TEST, NM',
  latitude_deg: 36.45,
  longitude_deg: -105.667,
  elevation_m: 2161,
  timeZone_h: -7,
}

const two = (value: number): string => String(value).padStart(2, '0')

/** Month, day and hour (1 to 24) of the 8,760 hours. */
export function stamps(): { readonly month: number; readonly day: number; readonly hour: number }[] {
  return MONTH_DAYS.flatMap((days, m) =>
    Array.from({ length: days * 24 }, (_, i) => ({
      month: m + 1,
      day: Math.floor(i / 24) + 1,
      hour: (i % 24) + 1,
    })),
  )
}

const sun = sunHours(PLACE)
/** Simple radiation that fits the sun of the place: 60 % of what is outside. */
export const GLOBAL: readonly number[] = Array.from(sun.outside_Wm2, (value) => Math.round(value * 0.6))

/** Lines of a TMY3 file with temperature = hour of the day, so that the order can be checked. */
export function tmy3Lines(): string[] {
  return [
    '723663,"TEST",NM,-7.0,36.450,-105.667,2161',
    'Date (MM/DD/YYYY),Time (HH:MM),GHI (W/m^2),GHI source,DNI (W/m^2),DHI (W/m^2),OpqCld (tenths),Dry-bulb (C),Dry-bulb source,Dew-point (C),Pressure (mbar),Wspd (m/s)',
    ...stamps().map(
      ({ month, day, hour }, i) =>
        `${two(month)}/${two(day)}/1995,${two(hour)}:00,${GLOBAL[i]},1,0,${GLOBAL[i]},5,${hour},A,-5.5,784,2.5`,
    ),
  ]
}

/** Lines of our own hourly file with the same content. */
export function hourlyLines(): string[] {
  return [
    '# name: Test',
    '# latitude: 36.45',
    '# longitude: -105.667',
    '# elevation: 2161 m',
    '# time zone: -7',
    '# source: made for a test',
    'time,outdoor temperature [°C],dew point [°C],global radiation [W/m²]',
    ...stamps().map(
      ({ month, day, hour }, i) => `${two(month)}-${two(day)} ${two(hour)}:00,${hour},-5.5,${GLOBAL[i]}`,
    ),
  ]
}

/** One cell of one line replaced. */
export function withCell(lines: readonly string[], line: number, cell: number, value: string): string[] {
  return lines.map((text, i) =>
    i === line - 1
      ? text
          .split(',')
          .map((old, at) => (at === cell ? value : old))
          .join(',')
      : text,
  )
}
