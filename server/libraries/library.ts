import { readFileSync } from 'node:fs'
import { z } from 'zod'
import { libraryCover } from '#contract/cover.ts'
import { libraryGlazing } from '#contract/glazing.ts'
import { fuelLibrary, type Library } from '#contract/library.ts'
import { libraryMaterial } from '#contract/material.ts'
import { librarySoil } from '#contract/soil.ts'

const dataFolder = new URL('../../data/', import.meta.url)

/**
 * Materials, soils, covers, glazings and fuels of the project's data folder, checked against their schemas.
 *
 * @throws Error naming file, row and value: the library is ours, so a fault in it is our fault
 */
export function loadLibrary(): Library {
  loaded ??= readLibrary()
  return loaded
}

let loaded: Library | undefined

function readLibrary(): Library {
  const { woods, stoves } = read('fuels.json', fuelLibrary)
  return {
    materials: byId('materials.json', read('materials.json', rows('materials', libraryMaterial)).materials),
    soils: byId('soils.json', read('soils.json', rows('soils', librarySoil)).soils),
    covers: byId('covers.json', read('covers.json', rows('covers', libraryCover)).covers),
    glazings: byId('glazings.json', read('glazings.json', rows('glazings', libraryGlazing)).glazings),
    woods: byId('fuels.json', woods),
    stoves: byId('fuels.json', stoves),
  }
}

function rows<Name extends string, Row extends z.ZodType>(name: Name, row: Row) {
  return z.looseObject({ [name]: z.array(row).min(1) } as { [key in Name]: z.ZodArray<Row> })
}

function read<Schema extends z.ZodType>(file: string, schema: Schema): z.infer<Schema> {
  const parsed = schema.safeParse(JSON.parse(readFileSync(new URL(file, dataFolder), 'utf8')))
  if (parsed.success) return parsed.data
  const [{ path, message }] = parsed.error.issues
  throw new Error(`data/${file}, ${path.join('/')}: ${message}`)
}

function byId<Row extends { readonly id: string }>(file: string, list: readonly Row[]): Map<string, Row> {
  const map = new Map(list.map((row) => [row.id, row]))
  if (map.size < list.length) {
    const twice = list.find((row, i) => list.findIndex(({ id }) => id === row.id) < i)
    throw new Error(`data/${file}: the id "${twice?.id}" is given twice`)
  }
  return map
}
