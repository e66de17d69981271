import { mkdtemp, rm, truncate, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { gzipSync } from 'node:zlib'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { ClimateFileError } from '#engine/climate/climate-file-error.ts'
import { climateNames, loadClimate } from '../../server/climates/library.ts'
import { builtInPlaces } from '../../server/climates/normals-file.ts'
import { hourlyLines, tmy3Lines } from '../engine/climate/file-makers.ts'

let folder = ''
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'climates-'))
})
afterAll(() => rm(folder, { recursive: true }))

async function file(name: string, content: string | Uint8Array): Promise<string> {
  const whole = path.join(folder, name)
  await writeFile(whole, content)
  return whole
}

test('at least 14 built-in places on five continents or more, each with its source', () => {
  const places = builtInPlaces()
  expect(places.length).toBe(27)
  expect(new Set(places.map(({ continent }) => continent)).size).toBeGreaterThanOrEqual(5)
  expect(new Set(places.map(({ id }) => id)).size).toBe(places.length)
  for (const { normals } of places) expect(normals.source.length).toBeGreaterThan(20)
})

test('a built-in climate is found by id, place or full name, in any letter case', async () => {
  expect(climateNames()[0]).toEqual({ id: 'taos', name: 'Taos, New Mexico, USA' })
  const year = await loadClimate('taos')
  expect(year.place.elevation_m).toBe(2161)
  for (const name of ['TAOS', 'Taos, New Mexico, USA']) {
    expect((await loadClimate(name)).outdoor_C).toEqual(year.outdoor_C)
  }
  for (const name of ['La Quiaca', "Yan'an", 'nevsehir', 'Nevşehir', 'Addis Ababa', 'Tromsø']) {
    expect((await loadClimate(name)).source).toMatch(/^Generated/)
  }
})

test('files are recognised by content, packed or not', async () => {
  const tmy3 = tmy3Lines().join('\n')
  expect((await loadClimate(await file('a.csv', tmy3))).source).toContain('TMY3')
  expect((await loadClimate(await file('a.csv.gz', gzipSync(tmy3)))).source).toContain('TMY3')
  expect((await loadClimate(await file('b.CSV', hourlyLines().join('\r\n')))).source).toContain(
    'made for a test',
  )
  const latin1 = Buffer.from(hourlyLines().join('\n'), 'latin1')
  expect((await loadClimate(await file('c.csv', latin1))).outdoor_C[0]).toBe(1)
})

test('an unknown name lists near ones', async () => {
  await expect(loadClimate('Toas')).rejects.toThrow(/no built-in climate 'Toas'. Did you mean taos/)
  await expect(loadClimate('Minnesota')).rejects.toThrow(/minneapolis/)
  await expect(loadClimate('qqqqqqqq')).rejects.toThrow(/Built in are taos/)
})

test('a file that is missing, a folder, of another kind, broken or empty gives one clear message', async () => {
  const fails = async (name: string, words: RegExp): Promise<void> => {
    const error = await loadClimate(name).then(
      () => null,
      (reason: unknown) => reason,
    )
    expect(error).toBeInstanceOf(ClimateFileError)
    expect((error as Error).message).toMatch(words)
  }
  await fails(path.join(folder, 'none.csv'), /there is no such file/)
  await fails(await file('x.json', '{}'), /is a .csv or .csv.gz file/)
  await fails(await file('x.csv', '{"this": "is json"}'), /not a climate file/)
  await fails(await file('empty.csv', ''), /not a climate file/)
  await fails(await file('broken.csv.gz', 'no gzip'), /not a whole gzip file/)
  await fails(
    await file('cut.csv.gz', gzipSync(tmy3Lines().join('\n')).subarray(0, 5000)),
    /not a whole gzip/,
  )
})

test('a file of ten years of hours is refused by its number of lines', async () => {
  const lines = hourlyLines()
  const years = [...lines, ...Array.from({ length: 9 }, () => lines.slice(7)).flat()]
  await expect(loadClimate(await file('years.csv', years.join('\n')))).rejects.toThrow(
    /has 87607 lines.*Keep one year/,
  )
})

test('200 MB are refused unread, packed too', async () => {
  const large = await file('large.csv', '')
  await truncate(large, 200 * 1024 * 1024)
  await expect(loadClimate(large)).rejects.toThrow(/has 200 MB, more than 60 MB/)
  const packed = await file('large.csv.gz', gzipSync(Buffer.alloc(70 * 1024 * 1024), { level: 1 }))
  await expect(loadClimate(packed)).rejects.toThrow(/unpacks to more than 60 MB/)
})
