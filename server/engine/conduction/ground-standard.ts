/**
 * Steady heat through ground floors by the closed formulas of ISO 13370:2017 (from memory): a second
 * opinion beside the ground sections, and the language that permit offices speak.
 */

const SURFACE = { inside: 0.17, outside: 0.04 }

export interface GroundFloor {
  readonly area_m2: number
  /** Exposed perimeter [m]. */
  readonly perimeter_m: number
  /** Full thickness of the outer walls [m]. */
  readonly wall_m: number
  readonly soil_WmK: number
  /** Resistance of the floor's own layers [m² K/W]. */
  readonly floor_m2KW: number
}

/** B' = A / (P/2) [m] (clause 8.1). */
export function characteristicDimension(floor: Pick<GroundFloor, 'area_m2' | 'perimeter_m'>): number {
  return floor.area_m2 / (0.5 * floor.perimeter_m)
}

/** Soil as thick as floor, films and wall insulate: d = w + λ (Rsi + Rf + Rse) [m]. */
export function equivalentThickness(floor: GroundFloor): number {
  return floor.wall_m + floor.soil_WmK * (SURFACE.inside + floor.floor_m2KW + SURFACE.outside)
}

/**
 * U-value of a slab on the ground [W/(m² K)], clause 7.2:
 * d < B': 2 λ / (π B' + d) · ln(π B'/d + 1);  else λ / (0.457 B' + d).
 */
export function slabUValue(floor: GroundFloor): number {
  const width = characteristicDimension(floor)
  const d = equivalentThickness(floor)
  const { soil_WmK } = floor
  return d < width
    ? ((2 * soil_WmK) / (Math.PI * width + d)) * Math.log((Math.PI * width) / d + 1)
    : soil_WmK / (0.457 * width + d)
}

/**
 * Yearly periodic heat transfer coefficients of a slab on the ground [W/K], annex H.
 *
 * @param depth_m of the yearly wave in the soil
 * @returns inside: for the room's yearly wave; outside: for that of the outdoor air
 */
export function slabPeriodic(floor: GroundFloor, depth_m: number): { inside_WK: number; outside_WK: number } {
  const d = equivalentThickness(floor)
  const { area_m2, perimeter_m, soil_WmK } = floor
  return {
    inside_WK: area_m2 * (soil_WmK / d) * Math.sqrt(2 / ((1 + depth_m / d) ** 2 + 1)),
    outside_WK: 0.37 * perimeter_m * soil_WmK * Math.log(depth_m / d + 1),
  }
}

/**
 * What insulation along the edge of a slab changes, per metre of perimeter [W/(m K)], annex B; negative.
 *
 * @param way `level` for a wing of width D, `upright` for a skirt of depth D
 */
export function edgeInsulation(
  floor: GroundFloor,
  edge: {
    readonly way: 'level' | 'upright'
    readonly size_m: number
    readonly thickness_m: number
    readonly conductivity_WmK: number
  },
): number {
  const d = equivalentThickness(floor)
  const { soil_WmK } = floor
  const added_m = (edge.thickness_m / edge.conductivity_WmK - edge.thickness_m / soil_WmK) * soil_WmK
  const size_m = edge.way === 'upright' ? 2 * edge.size_m : edge.size_m
  return -(soil_WmK / Math.PI) * (Math.log(size_m / d + 1) - Math.log(size_m / (d + added_m) + 1))
}

/**
 * U-values of a heated basement [W/(m² K)], clause 7.4.
 *
 * @param depth_m of the floor below ground
 * @param wall_m2KW resistance of the basement walls, all layers
 */
export function basementUValues(
  floor: GroundFloor,
  depth_m: number,
  wall_m2KW: number,
): { floor: number; wall: number; mean: number } {
  const { soil_WmK, area_m2, perimeter_m } = floor
  const width = characteristicDimension(floor)
  const df = equivalentThickness(floor)
  const dw = soil_WmK * (0.13 + wall_m2KW + SURFACE.outside)
  const lower = df + 0.5 * depth_m
  const ofFloor =
    lower < width
      ? ((2 * soil_WmK) / (Math.PI * width + lower)) * Math.log((Math.PI * width) / lower + 1)
      : soil_WmK / (0.457 * width + lower)
  const least = Math.min(df, dw)
  const ofWall =
    ((2 * soil_WmK) / (Math.PI * depth_m)) *
    (1 + (0.5 * least) / (least + depth_m)) *
    Math.log(depth_m / dw + 1)
  const wallArea_m2 = depth_m * perimeter_m
  return {
    floor: ofFloor,
    wall: ofWall,
    mean: (area_m2 * ofFloor + wallArea_m2 * ofWall) / (area_m2 + wallArea_m2),
  }
}
