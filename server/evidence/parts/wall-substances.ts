/** Conductivity and volumetric heat of the check cases' substances. */
export type Substance = readonly [conductivity_WmK: number, volumetricHeat_Jm3K: number]
export const CONCRETE: Substance = [1.8, 2.4e6]
export const ADOBE: Substance = [0.6, 1.6e6]
export const RAMMED_EARTH: Substance = [1.1, 2.0e6]
export const EPS: Substance = [0.04, 42000]
export const RENDER: Substance = [1.0, 1.8e6]

export const layer = ([conductivity_WmK, volumetricHeat_Jm3K]: Substance, thickness_m: number) => ({
  name: 'layer',
  thickness_m,
  conductivity_WmK,
  volumetricHeat_Jm3K,
})

/** The largest of some deviations; NaN when there is none, so that an empty table fails. */
export const worst = (values: readonly number[]) => (values.length ? Math.max(...values) : NaN)
