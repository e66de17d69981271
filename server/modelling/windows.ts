import type { Library } from '#contract/library.ts'
import type { WindowOpening } from '#contract/opening.ts'
import type { Option } from '#contract/option.ts'
import type { GlazingData, WindowModel } from '#engine/zone/house-model.ts'
import type { SurfaceFilms } from './surface-films.ts'

/** Glass is no metal: its emittance (EN 673, from memory). */
const GLASS_EMITTANCE = 0.837

export function windowModels(option: Option, library: Library, films: SurfaceFilms): WindowModel[] {
  return option.sides.flatMap((side) =>
    side.openings
      .filter((opening) => opening.kind === 'window')
      .map((opening) => windowModel(opening, `${side.name}: ${opening.name}`, side.faces_deg)),
  )

  function windowModel(opening: WindowOpening, name: string, faces_deg: number): WindowModel {
    return {
      name,
      area_m2: opening.width_m * opening.height_m,
      frameShare: opening.frameShare,
      frameU_Wm2K: opening.frameU_Wm2K,
      glazing: glazingData(opening.glazing, option, library),
      exposure: {
        tilt_deg: opening.tilt_deg,
        faces_deg,
        solarAbsorptance: 0,
        emittance: GLASS_EMITTANCE,
        film_Wm2K: films.glassOutside.combined_Wm2K,
        radiative_Wm2K: films.glassOutside.radiative_Wm2K,
        evaporativeShare: 0,
      },
      ...films.glassInside,
      width_m: opening.width_m,
      height_m: opening.height_m,
      sill_m: opening.sill_m,
      overhang: opening.overhang ?? null,
      fins: opening.fins ?? null,
      shutter: opening.shutter ?? null,
      shade: opening.shade ?? null,
    }
  }
}

/** Opaque doors as a plain conductance [W/K]. */
export function doorLoss(option: Option): number {
  let loss_WK = 0
  for (const { openings } of option.sides)
    for (const opening of openings)
      if (opening.kind === 'door') loss_WK += opening.u_Wm2K * opening.width_m * opening.height_m
  return loss_WK
}

function glazingData(id: string, option: Option, library: Library): GlazingData {
  const row = option.glazings.find((own) => own.id === id) ?? library.glazings.get(id)
  if (!row) throw new RangeError(`There is no glazing "${id}".`)
  const { u_Wm2K, transmittance, solarFactor, diffuseTransmittance, diffuseSolarFactor } = row
  return { u_Wm2K, transmittance, solarFactor, diffuseTransmittance, diffuseSolarFactor }
}
