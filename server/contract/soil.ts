import { z } from 'zod'
import { conductivity, density, provenance, range, specificHeat } from './material.ts'
import { id, prose, title } from './quantities.ts'

/** Dry is kept under an umbrella, not oven-dry. All three are always run together. */
export const SOIL_STATES = ['dry', 'damp', 'wet'] as const
export type SoilState = (typeof SOIL_STATES)[number]

const ownState = z.strictObject({
  conductivity_WmK: conductivity,
  /** Dry density; the water is counted in the specific heat. */
  density_kgm3: density.positive(),
  /** Of a kilogram of dry soil with its water. */
  specificHeat_JkgK: specificHeat.positive(),
})

/** A soil of the designer's own in its three states. */
export const ownSoil = z.strictObject({
  id,
  name: title,
  dry: ownState,
  damp: ownState,
  wet: ownState,
  source: prose.optional(),
})
export type OwnSoil = z.infer<typeof ownSoil>

const libraryState = z.strictObject({
  conductivity_WmK: range(conductivity),
  density_kgm3: range(density.positive()),
  specificHeat_JkgK: range(specificHeat.positive()),
  /** What this state means for this soil. */
  moisture: prose,
  source: prose,
  provenance,
})

/** A row of data/soils.json. */
export const librarySoil = z.strictObject({
  id,
  name: title,
  dry: libraryState,
  damp: libraryState,
  wet: libraryState,
  note: prose.optional(),
})
export type LibrarySoil = z.infer<typeof librarySoil>

/** The ground under and around the house, and which state the designer expects. */
export const soilChoice = z.strictObject({
  id,
  guess: z.enum(SOIL_STATES).default('damp'),
})
