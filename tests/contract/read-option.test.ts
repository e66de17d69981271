import fc from 'fast-check'
import { expect, test } from 'vitest'
import { OptionError, type Issue } from '#contract/option-error.ts'
import { readOption, readOptionText } from '#contract/read-option.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { plainOption } from './plain-option.ts'

const library = loadLibrary()

function issuesOf(json: unknown): readonly Issue[] {
  try {
    readOption(json, library)
  } catch (error) {
    if (error instanceof OptionError) return error.issues
    throw error
  }
  return []
}

/** The plain option with one value set (or, for undefined, taken away) at a pointer. */
function changed(...changes: readonly [pointer: string, value: unknown][]): unknown {
  const option = plainOption() as unknown
  for (const [pointer, value] of changes) {
    const steps = pointer.slice(2).split('/')
    const last = steps.pop()!
    const parent = steps.reduce((at, step) => (at as Record<string, unknown>)[step], option)
    const place = parent as Record<string, unknown>
    if (value === undefined) delete place[last]
    else place[last] = value
  }
  return option
}

test('a whole option is read and what it leaves out is filled in', () => {
  const option = readOption(plainOption(), library)
  expect(option.floor).toMatchObject({ level_m: 0, below: { kind: 'ground' } })
  expect(option.air.infiltration).toEqual({ kind: 'fixed', changes_h: 0.3 })
  expect(option.use.people).toBe(2)
  expect(option.sides[1].openings).toEqual([])
})

const berm = '#/sides/0/berm'
const window = '#/sides/2/openings/0'

/** What was done, where it is told, and words that the message must have: the value sent among them. */
const faults: readonly [title: string, changes: [string, unknown][], pointer: string, says: RegExp][] = [
  ['an unknown name', [['#/sides/0/colour', 'red']], '#/sides/0/colour', /no such name/],
  ['an unknown name on top', [['#/walls', []]], '#/walls', /no such name/],
  ['a name with a slash in it', [['#/room/a~b', 1]], '#/room/a~0b', /no such name/],
  [
    'a thickness of 0',
    [['#/assemblies/0/layers/0/thickness_m', 0]],
    '#/assemblies/0/layers/0/thickness_m',
    /0\.0001; you sent 0\./,
  ],
  [
    'a negative thickness',
    [['#/assemblies/0/layers/0/thickness_m', -0.05]],
    '#/assemblies/0/layers/0/thickness_m',
    /you sent -0\.05/,
  ],
  [
    'a negative umbrella',
    [['#/sides/0/umbrella/layers/0/thickness_m', -1]],
    '#/sides/0/umbrella/layers/0/thickness_m',
    /you sent -1/,
  ],
  [
    'glass wider than its wall',
    [
      [`${window}/width_m`, 12],
      [`${window}/fromLeft_m`, undefined],
    ],
    `${window}/width_m`,
    /12 m wide, its wall only 10 m long/,
  ],
  [
    'glass higher than its wall',
    [[`${window}/height_m`, 3]],
    `${window}/height_m`,
    /3\.5 m above the floor.*its wall only 2\.5 m/,
  ],
  [
    'an opening beyond the end of its wall',
    [[`${window}/fromLeft_m`, 8]],
    `${window}/fromLeft_m`,
    /ends 11 m from the left.*10 m/,
  ],
  [
    'two openings over each other',
    [['#/sides/2/openings/1/fromLeft_m', 2]],
    '#/sides/2/openings/1/fromLeft_m',
    /"Door" overlaps "Window"/,
  ],
  [
    'more openings than fit beside each other',
    [
      [`${window}/width_m`, 9.5],
      [`${window}/fromLeft_m`, undefined],
    ],
    '#/sides/2/openings/1/width_m',
    /10\.4 m wide together.*10 m long/,
  ],
  [
    'a berm higher than its wall',
    [[`${berm}/height_m`, 2.6]],
    `${berm}/height_m`,
    /2\.6 m high, its wall ends 2\.5 m/,
  ],
  [
    'a berm as high as a wall that is dug in',
    [
      ['#/floor/level_m', -1.2],
      ['#/sides/2/openings', []],
    ],
    `${berm}/height_m`,
    /1\.5 m high, its wall ends 1\.3 m/,
  ],
  ['a berm without crest', [[`${berm}/crest_m`, 0]], `${berm}/crest_m`, /you sent 0/],
  [
    'an opening under the soil of a berm',
    [
      ['#/sides/2/openings/1/height_m', 1],
      ['#/sides/2/openings/1/sill_m', 1.2],
      ['#/sides/2/berm', { height_m: 1, crest_m: 1, runPerRise: 2 }],
    ],
    `${window}/sill_m`,
    /begins 0\.5 m above the floor, but the berm against it reaches 1 m/,
  ],
  [
    'an opening under level ground',
    [
      ['#/sides/2/openings/1/height_m', 1],
      ['#/sides/2/openings/1/sill_m', 1.2],
      ['#/floor/level_m', -0.6],
    ],
    `${window}/sill_m`,
    /level ground outside reaches 0\.6 m/,
  ],
  [
    'an umbrella without a berm',
    [[berm, undefined]],
    '#/sides/0/umbrella',
    /lies on a berm, and this side has none/,
  ],
  [
    'a wing in a berm',
    [['#/sides/0/wing', { layers: [{ material: 'eps', thickness_m: 0.1 }], reach_m: 1 }]],
    '#/sides/0/wing',
    /umbrella instead/,
  ],
  [
    'layers thicker than the berm',
    [[`${berm}/height_m`, 0.3]],
    '#/sides/0/cover/layers',
    /0\.3 m thick together, the berm is 0\.3 m high/,
  ],
  ['an angle of 360', [['#/sides/0/faces_deg', 360]], '#/sides/0/faces_deg', /less than 360; you sent 360/],
  ['a negative angle', [['#/sides/0/faces_deg', -10]], '#/sides/0/faces_deg', /at least 0; you sent -10/],
  ['a roof steeper than 75', [['#/roof/tilt_deg', 91]], '#/roof/tilt_deg', /you sent 91/],
  ['NaN', [['#/room/height_m', NaN]], '#/room/height_m', /a number; you sent NaN/],
  ['Infinity', [[`${berm}/height_m`, Infinity]], `${berm}/height_m`, /a number; you sent Infinity/],
  ['a number in quotes', [['#/room/height_m', '2.5']], '#/room/height_m', /a number; you sent "2\.5"/],
  ['null for a number', [['#/room/height_m', null]], '#/room/height_m', /a number; you sent null/],
  ['a missing number', [['#/room/height_m', undefined]], '#/room/height_m', /Is missing: give a number/],
  ['sides that do not close', [['#/sides/0/length_m', 8]], '#/sides', /ends 2 m from the start/],
  [
    'a floor that the sides do not enclose',
    [['#/room/floorArea_m2', 90]],
    '#/room/floorArea_m2',
    /enclose 60 m², not the 90 m²/,
  ],
  ['two sides of one name', [['#/sides/1/name', 'North']], '#/sides/1/name', /"North" is given twice/],
  [
    'an unknown material',
    [['#/assemblies/0/layers/0/material', 'adobee']],
    '#/assemblies/0/layers/0/material',
    /no material or soil with the id "adobee". Did you mean "adobe"/,
  ],
  [
    'an unknown assembly',
    [['#/sides/1/wall', 'brick']],
    '#/sides/1/wall',
    /no assembly in this option with the id "brick"/,
  ],
  [
    'an unknown glazing',
    [[`${window}/glazing`, 'crystal']],
    `${window}/glazing`,
    /no glazing with the id "crystal"/,
  ],
  ['an unknown soil', [['#/soil/id', 'moondust']], '#/soil/id', /no soil with the id "moondust"/],
  ['a floor on the ground without a soil', [['#/soil', undefined]], '#/soil', /needs a soil/],
  [
    'a state of soil that does not exist',
    [['#/soil/guess', 'moist']],
    '#/soil/guess',
    /"dry", "damp" or "wet"; you sent "moist"/,
  ],
  [
    'a month of 13',
    [['#/heating', { set_C: 20, months: [1, 13] }]],
    '#/heating/months/1',
    /at most 12; you sent 13/,
  ],
  ['a month twice', [['#/heating', { set_C: 20, months: [1, 1] }]], '#/heating/months', /each month once/],
  [
    'an hour of 25',
    [['#/air', { flush: { changes_h: 5, from_h: 25 } }]],
    '#/air/flush/from_h',
    /at most 24; you sent 25/,
  ],
  [
    '23 hours of a day',
    [['#/use', { appliances_W: new Array(23).fill(100) }]],
    '#/use/appliances_W',
    /exactly 24 entries; you sent a list of 23/,
  ],
  [
    'one bad hour of a day',
    [['#/use', { appliances_W: [...new Array(23).fill(100), -5] }]],
    '#/use/appliances_W/23',
    /at least 0; you sent -5/,
  ],
  [
    'text for an hourly value',
    [['#/use', { appliances_W: 'some' }]],
    '#/use/appliances_W',
    /one number, or a list of 24; you sent "some"/,
  ],
  [
    'heating above cooling',
    [
      ['#/heating', { set_C: 22 }],
      ['#/cooling', { set_C: 20 }],
    ],
    '#/heating/set_C',
    /heats to 22 °C while cooling works down to 20 °C/,
  ],
  [
    'comfort upside down',
    [['#/comfort', { low_C: 28, high_C: 20 }]],
    '#/comfort/low_C',
    /begins at 28 °C and ends at 20 °C/,
  ],
  [
    'a footing above the floor',
    [['#/sides/1/footing', { material: 'concrete_dense', depth_m: 0.05 }]],
    '#/sides/1/footing/depth_m',
    /ends 0\.05 m below the level ground, the floor's layers 0\.1 m/,
  ],
  [
    'a skirt upside down',
    [['#/sides/1/skirt', { material: 'eps', thickness_m: 0.05, top_m: -0.5, bottom_m: 0 }]],
    '#/sides/1/skirt/bottom_m',
    /from -0\.5 m down to 0 m/,
  ],
  [
    'a skirt above the soil',
    [['#/sides/1/skirt', { material: 'eps', thickness_m: 0.05, top_m: 0.4, bottom_m: -0.5 }]],
    '#/sides/1/skirt/top_m',
    /begins 0\.4 m above the level ground/,
  ],
  [
    'a probe inside the wall',
    [['#/sides/1/probes', [{ name: 'p', fromWall_m: -0.1, depth_m: 1 }]]],
    '#/sides/1/probes/0/fromWall_m',
    /-0\.1 m is not below the floor/,
  ],
  [
    'a berm against a floor of constant temperature',
    [
      ['#/sides/0/umbrella', undefined],
      ['#/sides/0/cover', undefined],
      ['#/floor/below', { kind: 'constant temperature', temperature_C: 10 }],
    ],
    berm,
    /no ground here/,
  ],
  [
    'an unknown kind of opening',
    [[`${window}/kind`, 'hole']],
    `${window}/kind`,
    /"window" or "door"; you sent "hole"/,
  ],
  [
    'glass that passes more than it lets in',
    [['#/glazings/0/transmittance/3', 0.9]],
    '#/glazings/0/solarFactor/3',
    /At 30° the glass passes 0\.9/,
  ],
  [
    'an own material with the id of the library',
    [
      [
        '#/materials',
        [{ id: 'adobe', name: 'Mine', conductivity_WmK: 0.6, density_kgm3: 1600, specificHeat_JkgK: 1000 }],
      ],
    ],
    '#/materials/0/id',
    /belongs to a row of the library/,
  ],
  [
    'an own material without conductivity',
    [
      [
        '#/materials',
        [{ id: 'mine', name: 'Mine', conductivity_WmK: 0, density_kgm3: 1600, specificHeat_JkgK: 1000 }],
      ],
    ],
    '#/materials/0/conductivity_WmK',
    /you sent 0/,
  ],
  ['another format', [['#/loamkeep', 2]], '#/loamkeep', /Must be 1; you sent 2/],
]

test.each(faults)('%s: one message, with the path and the value', (_, changes, pointer, says) => {
  const issues = issuesOf(changed(...changes))
  expect(issues.map((issue) => issue.pointer)).toEqual([pointer])
  expect(issues[0].detail).toMatch(says)
})

test('all faults of a document are told at once', () => {
  const issues = issuesOf(changed([`${berm}/height_m`, 9], ['#/sides/1/wall', 'x'], ['#/soil/id', 'y']))
  expect(issues.map(({ pointer }) => pointer).sort()).toEqual(
    [`${berm}/height_m`, '#/sides/1/wall', '#/soil/id'].sort(),
  )
})

test('openings together larger than their wall are told of once', () => {
  const side = {
    name: 'South',
    length_m: 10,
    faces_deg: 180,
    wall: 'wall',
    openings: [0, 1, 2].map((k) => ({
      kind: 'window',
      name: `Glass ${k}`,
      width_m: 9,
      height_m: 1.2,
      sill_m: 0.5,
      glazing: 'glass',
    })),
  }
  const [issue, ...rest] = issuesOf(changed(['#/sides/2', side]))
  expect(rest).toEqual([])
  expect(issue.pointer).toBe('#/sides/2/openings')
  expect(issue.detail).toMatch(/32\.4 m² together, the wall of "South" has 25 m²/)
})

test.each([
  ['text', 'hello'],
  ['a list', []],
  ['null', null],
  ['a number', 5],
])('%s instead of an option is one fault at the root', (_, json) => {
  expect(issuesOf(json).map(({ pointer }) => pointer)).toEqual(['#'])
})

test('text that is not JSON is one fault that says so', () => {
  for (const text of ['', '{ "name": NaN }', '<html>', '{"a":1,}']) {
    expect(() => readOptionText(text, library)).toThrow(/^#: This is not JSON/)
  }
})

test('a byte order mark does no harm, 1e999 is refused as infinite', () => {
  const text = JSON.stringify(plainOption())
  expect(readOptionText(`\uFEFF${text}`, library).name).toBe('Plain room')
  expect(() => readOptionText(text.replace('"height_m":2.5', '"height_m":1e999'), library)).toThrow(
    /#\/room\/height_m: Must be a number; you sent Infinity/,
  )
})

test('any JSON whatever is an option or an OptionError, never another error', () => {
  fc.assert(
    fc.property(fc.jsonValue(), (json) => {
      issuesOf(json)
    }),
    { seed: 1, numRuns: 300 },
  )
})

test('any value in any place of an option is an option or an OptionError, never another error', () => {
  const places: string[] = []
  const collect = (value: unknown, at: string) => {
    places.push(at)
    if (typeof value === 'object' && value !== null)
      for (const [key, inner] of Object.entries(value)) collect(inner, `${at}/${key}`)
  }
  for (const [key, value] of Object.entries(plainOption())) collect(value, `#/${key}`)
  fc.assert(
    fc.property(fc.constantFrom(...places), fc.jsonValue(), (place, value) => {
      issuesOf(changed([place, value]))
    }),
    { seed: 2, numRuns: 600 },
  )
})
