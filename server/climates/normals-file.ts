import { readFileSync } from 'node:fs'
import type { MonthlyNormals } from '#engine/climate/normals.ts'

/** A place with built-in monthly normals. */
export interface BuiltInPlace {
  /** Short name that never changes, `taos`. */
  readonly id: string
  /** `Taos, New Mexico, USA`. */
  readonly name: string
  readonly continent: string
  /** What the climate is like, a few words. */
  readonly description: string
  readonly normals: MonthlyNormals
}

/** One place of data/climates/normals.json. */
interface NormalsRow {
  readonly id: string
  readonly name: string
  readonly continent: string
  readonly description: string
  readonly latitude_deg: number
  readonly longitude_deg: number
  readonly elevation_m: number
  readonly timeZone_h: number
  readonly source: string
  readonly estimated: readonly string[]
  readonly mean_C: readonly number[]
  readonly highest_C: readonly number[]
  readonly lowest_C: readonly number[]
  readonly global_kWhm2day: readonly number[]
  readonly diffuse_kWhm2day?: readonly number[]
  readonly dewPoint_C: readonly number[]
  readonly wind_ms: readonly number[]
  readonly pressure_hPa: readonly number[]
  readonly daySpread_K?: number
}

/** Places of the text of data/climates/normals.json. */
export function parseNormals(text: string): readonly BuiltInPlace[] {
  const { places } = JSON.parse(text) as { readonly places: readonly NormalsRow[] }
  return places.map((row) => ({
    id: row.id,
    name: row.name,
    continent: row.continent,
    description: row.description,
    normals: {
      place: {
        name: row.name,
        latitude_deg: row.latitude_deg,
        longitude_deg: row.longitude_deg,
        elevation_m: row.elevation_m,
        timeZone_h: row.timeZone_h,
      },
      source: row.source,
      estimated: row.estimated,
      mean_C: row.mean_C,
      highest_C: row.highest_C,
      lowest_C: row.lowest_C,
      global_kWhm2day: row.global_kWhm2day,
      diffuse_kWhm2day: row.diffuse_kWhm2day,
      dewPoint_C: row.dewPoint_C,
      wind_ms: row.wind_ms,
      pressure_Pa: row.pressure_hPa.map((value) => value * 100),
      daySpread_K: row.daySpread_K,
    },
  }))
}

const file = new URL('../../data/climates/normals.json', import.meta.url)
let places: readonly BuiltInPlace[] | null = null

/** The built-in places, in the order of the file; read once. */
export function builtInPlaces(): readonly BuiltInPlace[] {
  places ??= parseNormals(readFileSync(file, 'utf8'))
  return places
}
