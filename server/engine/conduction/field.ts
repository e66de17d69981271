import { undisturbedGround, type GroundWave } from '../climate/ground.ts'
import type { SectionMesh } from './section.ts'

/** Undisturbed ground at every node, depth below level ground; soil heaped above it is taken at the surface's temperature. */
export function undisturbedField(mesh: SectionMesh, wave: GroundWave, time_s: number): Float64Array {
  return undisturbedGround(
    wave,
    mesh.z_m.map((z) => Math.max(0, -z)),
    time_s,
  )
}
