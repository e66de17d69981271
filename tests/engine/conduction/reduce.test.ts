import { expect, test } from 'vitest'
import { projectField } from '#engine/conduction/full-run.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import { reductionError } from '#engine/conduction/reduction-error.ts'
import { symmetricModes } from '#engine/conduction/symmetric-modes.ts'
import { earthWall, soilBlock } from './make-systems.ts'

const systems = [
  ['a wall whose modes are all kept', earthWall()],
  ['a finer wall', earthWall({ refinement: 4 })],
  ['a block of soil', soilBlock()],
] as const

for (const [name, system] of systems) {
  const element = reduce(system)
  const { modes, decay_s, gain, content, conductance_WK, basis } = element
  const groups = conductance_WK.length

  test(`${name}: a uniform field lies in the span of the modes, to rounding`, () => {
    for (let node = 0; node < system.capacity_JK.length; node++) {
      let value = 0
      for (let k = 0; k < modes; k++) value += basis[node * modes + k] * content[k]
      expect(value).toBeCloseTo(1, 9)
    }
  })

  test(`${name}: K 1 = B 1 and 1ᵀ B = films hold for the modes, to rounding`, () => {
    for (let k = 0; k < modes; k++) {
      let sum = 0
      let size = 0
      for (let g = 0; g < groups; g++) {
        sum += gain[k * groups + g]
        size += Math.abs(gain[k * groups + g])
      }
      expect(Math.abs(sum - decay_s[k] * content[k])).toBeLessThan(1e-10 * size)
    }
    for (let g = 0; g < groups; g++) {
      const film = content.reduce((sum, value, k) => sum + value * gain[k * groups + g], 0)
      expect(film / conductance_WK[g]).toBeCloseTo(1, 11)
    }
  })

  test(`${name}: modes are ascending, decay, and are orthonormal in C`, () => {
    for (let k = 0; k < modes; k++) {
      expect(decay_s[k]).toBeGreaterThan(k === 0 ? 0 : decay_s[k - 1])
      for (let l = 0; l <= k; l++) {
        let dot = 0
        for (let node = 0; node < system.capacity_JK.length; node++)
          dot += basis[node * modes + k] * system.capacity_JK[node] * basis[node * modes + l]
        expect(dot).toBeCloseTo(k === l ? 1 : 0, 9)
      }
    }
  })

  test(`${name}: steady and yearly flows are those of all nodes`, () => {
    for (const { flow } of reductionError(system, element, [1e18, 365 * 86400]))
      expect(flow).toBeLessThan(1e-9)
  })

  test(`${name}: flows differ by no more than the tolerance for periods of 6 h and more`, () => {
    const periods = [20 * 365, 365, 60, 4, 1, 0.25].map((days) => days * 86400)
    // 10 or 20 shifts alone cost up to 0.1 % for a day; the rest is what leaving modes out may cost.
    for (const { flow } of reductionError(system, element, periods)) expect(flow).toBeLessThan(0.003 + 0.001)
  })
}

test('leaving no modes out lowers the error, and a wider tolerance keeps fewer modes', () => {
  const system = soilBlock()
  const whole = reduce(system, { tolerance: 0 })
  const usual = reduce(system)
  const rough = reduce(system, { tolerance: 0.05 })
  expect(whole.modes).toBeGreaterThan(usual.modes)
  expect(usual.modes).toBeGreaterThan(rough.modes)
  const error = (element: typeof whole) => reductionError(system, element, [86400 * 30])[0].flow
  expect(error(whole)).toBeLessThan(error(usual))
  expect(error(usual)).toBeLessThan(error(rough))
})

test('an extra field comes back from its modes to rounding', () => {
  const system = soilBlock()
  const field = Float64Array.from(system.capacity_JK, (_, node) => 10 + 8 * Math.sin(node / 7))
  const element = reduce(system, { extraFields: [field] })
  const modes = projectField(element, field)
  field.forEach((value, node) => {
    let back = 0
    for (let k = 0; k < element.modes; k++) back += element.basis[node * element.modes + k] * modes[k]
    expect(back).toBeCloseTo(value, 8)
  })
})

test('the same system gives the same modes to the last bit', () => {
  expect(reduce(soilBlock()).basis).toEqual(reduce(soilBlock()).basis)
})

test('throws RangeError for a node without capacity, and for a system that nothing holds', () => {
  const system = earthWall()
  expect(() =>
    reduce({ ...system, capacity_JK: system.capacity_JK.map((c, i) => (i === 3 ? 0 : c)) }),
  ).toThrow('Node 3')
  const loose = soilBlock()
  const { size, halfWidth } = loose.conductance_WK
  const nothing = { size, halfWidth, data: new Float64Array(loose.conductance_WK.data.length) }
  expect(() => reduce({ ...loose, conductance_WK: nothing })).toThrow(RangeError)
})

test('eigenvalues of a chain held at both ends are 4 sin²(kπ / 2(n + 1)) (discrete Laplacian)', () => {
  const n = 30
  const matrix = new Float64Array(n * n)
  for (let i = 0; i < n; i++) {
    matrix[i * n + i] = 2
    if (i > 0) matrix[i * n + i - 1] = matrix[(i - 1) * n + i] = -1
  }
  const { values } = symmetricModes(matrix, n)
  values.forEach((value, k) =>
    expect(value / (4 * Math.sin(((k + 1) * Math.PI) / (2 * (n + 1))) ** 2)).toBeCloseTo(1, 12),
  )
})

test('a small eigenvalue beside a large one keeps its digits: det and trace of a graded 2 × 2', () => {
  // [1e6, 1; 1, 2e-6 ]: the small one is (2 - 1) e-6 to 12 digits; a method that loses 1e-16 of 1e6 has 4.
  const { values } = symmetricModes(Float64Array.of(1e6, 1, 1, 2e-6), 2)
  expect(values[0] / 1e-6).toBeCloseTo(1, 10)
})
