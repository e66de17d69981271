import type { Films } from '#contract/films.ts'

export interface InsideFilm {
  readonly convective_Wm2K: number
  readonly radiative_Wm2K: number
}

export interface OutsideFilm {
  readonly combined_Wm2K: number
  /** For a black surface. */
  readonly radiative_Wm2K: number
}

export interface SurfaceFilms {
  readonly wall: InsideFilm
  readonly floor: InsideFilm
  readonly ceiling: InsideFilm
  readonly mass: InsideFilm
  readonly glassInside: InsideFilm
  readonly outside: OutsideFilm
  readonly ground: OutsideFilm
  readonly glassOutside: OutsideFilm
}

/** 0.9 × 5.7: emittance of building materials times the black coefficient at 20 °C (ISO 6946:2017, annex C). */
const RADIATIVE = 0.9 * 5.7

/**
 * ISO 6946:2017 takes 2.5 W/(m² K) for convection at walls, 5.0 for heat that rises and 0.7 for heat that
 * sinks, and recommends 2.5 where the direction changes (6.8, from memory). It does change at floor and
 * ceiling here: a sunlit floor warms the room by day and cools it in summer, a roof loses heat in winter
 * and gains it under the sun. So all faces have 2.5.
 */
const INSIDE: InsideFilm = { convective_Wm2K: 2.5, radiative_Wm2K: RADIATIVE }

/** 1 / 0.04 (ISO 6946); 5.1 is the black coefficient at 10 °C (same, annex C). */
const OUTSIDE: OutsideFilm = { combined_Wm2K: 25, radiative_Wm2K: 5.1 }

/** 7.7 inside, 3.6 by convection and 4.1 by radiation; 25 outside (EN 673:2011, from memory). */
const GLASS_INSIDE: InsideFilm = { convective_Wm2K: 3.6, radiative_Wm2K: 4.1 }

/** Surface coefficients of an option: as set by hand, otherwise the usual ones. */
export function surfaceFilms(given: Films): SurfaceFilms {
  return {
    wall: given.wall ?? INSIDE,
    floor: given.floor ?? INSIDE,
    ceiling: given.ceiling ?? INSIDE,
    mass: given.mass ?? INSIDE,
    glassInside: given.glassInside ?? GLASS_INSIDE,
    outside: given.outside ?? OUTSIDE,
    ground: given.ground ?? OUTSIDE,
    glassOutside: given.glassOutside ?? OUTSIDE,
  }
}

export const whole = (film: InsideFilm) => film.convective_Wm2K + film.radiative_Wm2K
