/** A complex number as [real, imaginary]. */
export type Complex = readonly [re: number, im: number]

export const plus = (a: Complex, b: Complex): Complex => [a[0] + b[0], a[1] + b[1]]
export const minus = (a: Complex, b: Complex): Complex => [a[0] - b[0], a[1] - b[1]]
export const times = (a: Complex, b: Complex): Complex => [
  a[0] * b[0] - a[1] * b[1],
  a[0] * b[1] + a[1] * b[0],
]
export const scaled = (a: Complex, factor: number): Complex => [a[0] * factor, a[1] * factor]
export const over = (a: Complex, b: Complex): Complex => {
  const square = b[0] * b[0] + b[1] * b[1]
  return [(a[0] * b[0] + a[1] * b[1]) / square, (a[1] * b[0] - a[0] * b[1]) / square]
}
export const exponential = (a: Complex): Complex => {
  const size = Math.exp(a[0])
  return [size * Math.cos(a[1]), size * Math.sin(a[1])]
}
export const size = (a: Complex): number => Math.hypot(a[0], a[1])
