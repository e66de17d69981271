import type { ElementSpec } from '../conduction/specs.ts'

/** How a plane looks at sun, sky and air. */
export interface Exposure {
  /** 0 lies flat facing up, 90 stands upright. */
  readonly tilt_deg: number
  /** Clockwise from north; of no effect when flat. */
  readonly faces_deg: number
  readonly solarAbsorptance: number
  readonly emittance: number
  /** Combined outer film, convection and radiation [W/(m² K)]; the same as in the element. */
  readonly film_Wm2K: number
  /** Radiative part of that film for a black surface [W/(m² K)]. */
  readonly radiative_Wm2K: number
  /** Share of the absorbed sun that leaves again as water vapour, 0 to 1 (moist or planted ground). */
  readonly evaporativeShare: number
}

/** A surface of the room. */
export interface RoomSurface {
  readonly name: string
  readonly area_m2: number
  /** Convective and radiative parts of its film [W/(m² K)]; their sum is the film in the element. */
  readonly convective_Wm2K: number
  readonly radiative_Wm2K: number
  readonly solarAbsorptance: number
  /** What sunlight meets when it enters: floors first, then walls across the room. */
  readonly part: 'floor' | 'wall' | 'ceiling' | 'mass'
  /** For walls: the direction that the outer side faces [deg clockwise from north]; null otherwise. */
  readonly faces_deg: number | null
}

/** What drives one boundary group of an element. */
export type BoundaryLink =
  | { readonly to: 'room'; readonly surface: RoomSurface }
  | { readonly to: 'outdoor'; readonly exposure: Exposure }
  | { readonly to: 'constant'; readonly temperature_C: number }

/** A conducting part of the house: walls, roof, partitions, water, ground sections. */
export interface HouseElement {
  readonly name: string
  readonly spec: ElementSpec
  /** Area [m²] of layers, length [m] of a section, number of lumped bodies. */
  readonly size: number
  /** One for each boundary group of the spec, by name. */
  readonly links: Readonly<Record<string, BoundaryLink>>
}

/** Optical and thermal data of glass, by angle of incidence 0, 10, … 90°. */
export interface GlazingData {
  /** Air to air, with standard films [W/(m² K)]. */
  readonly u_Wm2K: number
  /** Beam transmittance at 0, 10, … 90 degrees, 10 values. */
  readonly transmittance: readonly number[]
  /** Total solar energy transmittance (transmitted and inward-flowing) at the same angles. */
  readonly solarFactor: readonly number[]
  readonly diffuseTransmittance: number
  readonly diffuseSolarFactor: number
}

export interface WindowModel {
  readonly name: string
  /** Whole opening with frame. */
  readonly area_m2: number
  /** Share of the opening that is frame, 0 to below 1. */
  readonly frameShare: number
  readonly frameU_Wm2K: number
  readonly glazing: GlazingData
  /** Outer films and sky exchange; tilt 90 for upright glass. */
  readonly exposure: Exposure
  /** Combined inner film, as convective and radiative parts [W/(m² K)]. */
  readonly convective_Wm2K: number
  readonly radiative_Wm2K: number
  /** Geometry for shading: width, height and sill above the floor. */
  readonly width_m: number
  readonly height_m: number
  readonly sill_m: number
  readonly overhang: {
    readonly depth_m: number
    /** Above the head of the opening. */
    readonly rise_m: number
    /** Beyond the opening on each side. */
    readonly extra_m: number
  } | null
  /** Fins at both sides, seen from outside: depth, and gap between jamb and fin. */
  readonly fins: { readonly depth_m: number; readonly gap_m: number } | null
  /** Night shutters: thermal resistance added while closed [m² K/W]; hours in local standard time, may pass midnight; closed only when the sun is down. */
  readonly shutter: {
    readonly resistance_m2KW: number
    readonly from_h: number
    readonly to_h: number
    readonly months: readonly number[]
  } | null
  /** Seasonal shade: share of the sun that still passes in the given months (1 to 12). */
  readonly shade: { readonly passes: number; readonly months: readonly number[] } | null
}

export type Infiltration =
  | { readonly kind: 'fixed'; readonly changes_h: number }
  /** Effective leakage area with stack and wind coefficients (ASHRAE Fundamentals, basic model): Q = A √(Cs |ΔT| + Cw v²). */
  | { readonly kind: 'leakage'; readonly area_cm2: number; readonly stack: number; readonly wind: number }

export interface HouseModel {
  readonly room: {
    readonly floorArea_m2: number
    readonly volume_m3: number
    /** Depth from the sunny side to the wall across the room, for where the beam lands [m]. */
    readonly depth_m: number
    /** Capacity of air and light furniture as a multiple of the air alone, >= 1. */
    readonly airCapacityFactor: number
  }
  readonly elements: readonly HouseElement[]
  readonly windows: readonly WindowModel[]
  /** Opaque doors and bridges: a plain conductance to the outdoor air [W/K]. */
  readonly plainLoss_WK: number
  /** Ground reflectance for each month of the year, 12 values. */
  readonly groundReflectance: readonly number[]
  /** Altitude of the horizon [deg] by azimuth, evenly spaced clockwise from north; empty for a free horizon. */
  readonly horizon_deg: readonly number[]
  readonly infiltration: Infiltration
  readonly ventilation: {
    /** Fresh air by hour of the day [m³/s], 24 values. */
    readonly fresh_m3s: readonly number[]
    /** Share of heat recovered from it, 0 to below 1. */
    readonly recovery: number
  }
  /** Extra air by rule, or on a clock. */
  readonly flush: {
    readonly changes_h: number
    readonly from_h: number
    readonly to_h: number
    readonly months: readonly number[]
    /** Opens when the room was warmer than this [°C] … */
    readonly above_C: number
    /** … and warmer than outdoors by at least this [K]. */
    readonly byAtLeast_K: number
  } | null
  /** Sensible gains by hour of the day [W], 24 values each. */
  readonly gains: { readonly convective_W: readonly number[]; readonly radiative_W: readonly number[] }
  /** Backup heat: set temperature by hour of the day [°C] (null entries: off), limited power [W], convective share. */
  readonly heating: PlantModel | null
  readonly cooling: PlantModel | null
}

export interface PlantModel {
  /** 24 set temperatures by hour of the day [°C]; null where it is off. */
  readonly set_C: readonly (number | null)[]
  /** Months (1 to 12) in which it may run. */
  readonly months: readonly number[]
  readonly power_W: number
  /** Share given straight to the air, 0 to 1; the rest goes to the surfaces. */
  readonly convectiveShare: number
  /** What the thermostat feels. */
  readonly senses: 'air' | 'operative'
}
