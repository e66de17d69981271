import { readFile, stat } from 'node:fs/promises'
import { promisify } from 'node:util'
import { gunzip } from 'node:zlib'
import { ClimateFileError } from '#engine/climate/climate-file-error.ts'
import type { ClimateYear } from '#engine/climate/climate-year.ts'
import { generateYear } from '#engine/climate/generate-year.ts'
import { readHourlyCsv } from '#engine/climate/hourly-csv.ts'
import { looksLikeTmy3, readTmy3 } from '#engine/climate/tmy3.ts'
import { builtInPlaces, type BuiltInPlace } from './normals-file.ts'

/** Larger files are refused unread: a year of hours with seventy columns has 2 MB. */
export const LARGEST_FILE_BYTES = 60 * 1024 * 1024

/** One seed for all built-in years, so that every user of a place sees the same weather. */
export const BUILT_IN_SEED = 1

/** Ids and names of the built-in climates, in the order of the list. */
export function climateNames(): readonly { readonly id: string; readonly name: string }[] {
  return builtInPlaces().map(({ id, name }) => ({ id, name }))
}

/**
 * A climate year by name or from a file.
 *
 * @param nameOrFile id (`taos`) or place name (`Taos, New Mexico, USA`, or `Taos`) of a built-in climate, in
 *                   any letter case, or the path of a .csv or .csv.gz file, TMY3 or our own hourly format
 * @throws ClimateFileError for a file that is no climate year, RangeError for an unknown name
 */
export async function loadClimate(nameOrFile: string): Promise<ClimateYear> {
  const place = builtIn(nameOrFile)
  if (place !== undefined) return generateYear(place.normals, BUILT_IN_SEED)
  if (!/[/\\]|\.[a-z0-9]{1,5}$/i.test(nameOrFile)) throw unknownName(nameOrFile)
  const text = await readText(nameOrFile)
  try {
    return readClimateText(text)
  } catch (error) {
    // The reader knows lines only; which file they are in is known here.
    if (error instanceof ClimateFileError) error.message = `${nameOrFile}, ${error.message}`
    throw error
  }
}

/** Reads the text of a climate file, TMY3 or our own, recognised by content. */
export function readClimateText(text: string): ClimateYear {
  return looksLikeTmy3(text) ? readTmy3(text) : readHourlyCsv(text)
}

function builtIn(name: string): BuiltInPlace | undefined {
  const wanted = plain(name)
  return builtInPlaces().find(
    ({ id, name }) =>
      plain(id) === wanted || plain(name) === wanted || plain(name.split(/[,(]/)[0]) === wanted,
  )
}

/** Letters only: case, accents, spaces and hyphens do not matter. */
function plain(name: string): string {
  return name
    .normalize('NFD')
    .toLowerCase()
    .replaceAll('ø', 'o')
    .replaceAll('ı', 'i')
    .replace(/[^a-z]/g, '')
}

async function readText(path: string): Promise<string> {
  const isPacked = /\.gz$/i.test(path)
  if (!/\.csv(\.gz)?$/i.test(path)) {
    throw new ClimateFileError(
      null,
      `${path}: a climate is a .csv or .csv.gz file with hourly rows, or the name of a built-in climate.`,
    )
  }
  const facts = await stat(path).catch((error: NodeJS.ErrnoException) => {
    throw new ClimateFileError(
      null,
      error.code === 'ENOENT'
        ? `${path}: there is no such file.`
        : `${path}: cannot be read (${error.code ?? error.message}).`,
    )
  })
  if (!facts.isFile()) throw new ClimateFileError(null, `${path}: is not a file.`)
  if (facts.size > LARGEST_FILE_BYTES) throw tooLarge(path, facts.size)
  const bytes = await readFile(path)
  if (!isPacked) return decoded(bytes)
  try {
    return decoded(await promisify(gunzip)(bytes, { maxOutputLength: LARGEST_FILE_BYTES }))
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ERR_BUFFER_TOO_LARGE') throw tooLarge(path, null)
    throw new ClimateFileError(null, `${path}: is not a whole gzip file. Get it again.`)
  }
}

function tooLarge(path: string, bytes: number | null): ClimateFileError {
  const size =
    bytes === null ? 'unpacks to more than' : `has ${Math.round(bytes / 1024 / 1024)} MB, more than`
  return new ClimateFileError(
    null,
    `${path}: ${size} ${LARGEST_FILE_BYTES / 1024 / 1024} MB. A climate file holds one year of hours, about 2 MB.`,
  )
}

/** UTF-8, or Latin-1 where the bytes are not UTF-8. */
function decoded(bytes: Uint8Array): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    return new TextDecoder('latin1').decode(bytes)
  }
}

function unknownName(name: string): RangeError {
  const wanted = plain(name)
  const near = climateNames()
    .map((place) => ({
      place,
      distance: Math.min(
        ...[place.id, ...place.name.split(/[,(]/)].map((part) => edits(wanted, plain(part))),
      ),
    }))
    .filter(({ place, distance }) => distance <= 3 || plain(place.name).includes(wanted))
    .sort((a, b) => a.distance - b.distance)
    .slice(0, 5)
    .map(({ place }) => place.id)
  const help =
    near.length > 0
      ? `Did you mean ${near.join(', ')}?`
      : `Built in are ${climateNames()
          .map(({ id }) => id)
          .join(', ')}.`
  return new RangeError(
    `there is no built-in climate '${name.slice(0, 60)}'. ${help} A file needs its ending, .csv or .csv.gz.`,
  )
}

/** Levenshtein distance of two short words. */
function edits(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j)
  for (let i = 1; i <= a.length; i++) {
    const next = [i]
    for (let j = 1; j <= b.length; j++) {
      next[j] = Math.min(row[j] + 1, next[j - 1] + 1, row[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1))
    }
    row = next
  }
  return row[b.length]
}
