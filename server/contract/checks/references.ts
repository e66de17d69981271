import type { LayerInput } from '../assembly.ts'
import type { Library } from '../library.ts'
import type { Option } from '../option.ts'
import type { Report } from './check-option.ts'

/** Every id leads somewhere, and no id is given twice. */
export function checkReferences(option: Option, library: Library, report: Report): void {
  const { materials, soils, covers, glazings } = library
  const own = {
    materials: ownIds(option, 'materials', [materials, soils], report),
    soils: ownIds(option, 'soils', [soils, materials], report),
    covers: ownIds(option, 'covers', [covers], report),
    glazings: ownIds(option, 'glazings', [glazings], report),
  }
  const assemblies = ownIds(option, 'assemblies', [], report)
  const known = {
    material: new Set([...materials.keys(), ...soils.keys(), ...own.materials, ...own.soils]),
    substance: new Set([...materials.keys(), ...own.materials]),
    soil: new Set([...soils.keys(), ...own.soils]),
    cover: new Set([...covers.keys(), ...own.covers]),
    glazing: new Set([...glazings.keys(), ...own.glazings]),
    assembly: new Set(assemblies),
    wood: new Set(library.woods.keys()),
    stove: new Set(library.stoves.keys()),
  }
  const refer = (path: readonly PropertyKey[], what: keyof typeof known, id: string | undefined) => {
    if (id === undefined || known[what].has(id)) return
    const near = nearest(id, known[what])
    const help = near ? ` Did you mean "${near}"?` : ''
    report(path, `There is no ${names[what]} with the id "${id}".${help}`)
  }
  const layers = (path: readonly PropertyKey[], list: readonly LayerInput[] | undefined) =>
    list?.forEach((layer, k) => refer([...path, k, 'material'], 'material', layer.material))

  for (const [i, part] of option.assemblies.entries()) layers(['assemblies', i, 'layers'], part.layers)
  option.sides.forEach((side, i) => {
    const at = (...path: PropertyKey[]) => ['sides', i, ...path]
    refer(at('wall'), 'assembly', side.wall)
    side.openings.forEach((opening, k) => {
      if (opening.kind === 'window') refer(at('openings', k, 'glazing'), 'glazing', opening.glazing)
    })
    refer(at('berm', 'soil'), 'soil', side.berm?.soil)
    layers(at('umbrella', 'layers'), side.umbrella?.layers)
    layers(at('wing', 'layers'), side.wing?.layers)
    refer(at('cover', 'surface'), 'cover', side.cover?.surface)
    layers(at('cover', 'layers'), side.cover?.layers)
    refer(at('skirt', 'material'), 'substance', side.skirt?.material)
    refer(at('footing', 'material'), 'substance', side.footing?.material)
  })
  refer(['site', 'ground'], 'cover', option.site.ground)
  refer(['soil', 'id'], 'soil', option.soil?.id)
  refer(['floor', 'assembly'], 'assembly', option.floor.assembly)
  refer(['roof', 'assembly'], 'assembly', option.roof.assembly)
  refer(['roof', 'cover'], 'cover', option.roof.cover)
  for (const [i, part] of option.partitions.entries())
    refer(['partitions', i, 'assembly'], 'assembly', part.assembly)
  refer(['use', 'wood'], 'wood', option.use.wood)
  refer(['use', 'stove'], 'stove', option.use.stove)
}

const names = {
  material: 'material or soil',
  substance: 'material',
  soil: 'soil',
  cover: 'cover',
  glazing: 'glazing',
  assembly: 'assembly in this option',
  wood: 'wood',
  stove: 'stove',
}

function ownIds(
  option: Option,
  list: 'materials' | 'soils' | 'covers' | 'glazings' | 'assemblies',
  taken: readonly ReadonlyMap<string, unknown>[],
  report: Report,
): string[] {
  const ids = option[list].map(({ id }) => id)
  ids.forEach((id, i) => {
    if (ids.indexOf(id) < i) report([list, i, 'id'], `The id "${id}" is given twice; choose another one.`)
    else if (taken.some((rows) => rows.has(id)))
      report([list, i, 'id'], `The id "${id}" belongs to a row of the library; choose another one.`)
  })
  return ids
}

/** The known id that shares most pairs of letters with a misspelt one; undefined when none is near. */
function nearest(wrong: string, known: ReadonlySet<string>): string | undefined {
  const pairs = (text: string) => new Set(Array.from(text.slice(1), (_, i) => text.slice(i, i + 2)))
  const mine = pairs(wrong)
  let best: string | undefined
  let most = 0.5
  for (const id of known) {
    const theirs = pairs(id)
    const common = [...mine].filter((pair) => theirs.has(pair)).length
    const likeness = (2 * common) / (mine.size + theirs.size)
    if (likeness > most) [best, most] = [id, likeness]
  }
  return best
}
