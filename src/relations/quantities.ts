/** What a number is: its unit family, and with it the checks that every number of the kind passes. */
export type Kind = "density" | "percent" | "points" | "mass" | "volume" | "length" | "ratio" | "count" | "energy" | "temperature" | "water" | "speed";

export interface Quantity {
  /** the trade's name, as it stands in messages */
  readonly name: string;
  /** as printed; an underscore starts a subscript */
  readonly symbol: string;
  readonly kind: Kind;
  /** limits of what can be meant at all, in the quantity's own unit; outside them a number is refused */
  readonly from: number;
  readonly to: number;
  /** the lower limit itself is refused too */
  readonly above?: true;
  /** a percent that is rightly below 1, so that a fraction in its place cannot be told */
  readonly smallShare?: true;
  /** what an argument stands for when it is left out */
  readonly leftOut?: number;
}

const positive = { from: 0, to: Infinity, above: true } as const;
const orZero = { from: 0, to: Infinity } as const;

export const quantities = {
  wetDensity: { name: "wet density", symbol: "ρ", kind: "density", ...positive },
  dryDensity: { name: "dry density", symbol: "ρ_d", kind: "density", ...positive },
  maxDryDensity: { name: "maximum dry density", symbol: "ρ_d,max", kind: "density", ...positive },
  fillDryDensity: { name: "dry density of the fill", symbol: "ρ_d,fill", kind: "density", ...positive },
  bankDryDensity: { name: "dry density in the bank", symbol: "ρ_d,bank", kind: "density", ...positive },
  waterDensity: { name: "density of water", symbol: "ρ_w", kind: "density", ...positive },
  minDryDensity: { name: "minimum dry density", symbol: "ρ_d,min", kind: "density", ...positive },
  looseDryDensity: { name: "loose dry density", symbol: "ρ_d,loose", kind: "density", ...positive },
  moistDryDensity: { name: "dry density of the moist sand", symbol: "ρ_d,moist", kind: "density", ...positive },
  fineDryDensity: { name: "dry density of the fine fraction", symbol: "ρ_d,fine", kind: "density", ...positive },
  wholeDryDensity: { name: "dry density of the whole soil", symbol: "ρ_d,whole", kind: "density", ...positive },
  sandDensity: { name: "density of the sand", symbol: "ρ_sand", kind: "density", ...positive },
  convertedDensity: { name: "converted wet density", symbol: "ρ_conv", kind: "density", ...positive },
  maxDryUnitWeight: { name: "maximum dry unit weight", symbol: "γ_d,max", kind: "density", ...positive },
  unitWeightGain: { name: "gain in maximum dry unit weight", symbol: "Δγ_d", kind: "density", from: -Infinity, to: Infinity },
  gaugeWaterMass: { name: "water mass a volume by gauge", symbol: "M", kind: "density", ...orZero },
  coarseDryDensity: { name: "dry density of the coarse soil", symbol: "ρ_d,coarse", kind: "density", ...positive },
  finesDryDensity: { name: "dry density of the fines", symbol: "ρ_d,fines", kind: "density", ...positive },
  packedDryDensity: { name: "dry density at the packing limit", symbol: "ρ_d,packed", kind: "density", ...positive },
  allowance: { name: "allowance", symbol: "a", kind: "density", ...orZero },

  waterContent: { name: "water content", symbol: "w", kind: "percent", from: 0, to: 2000 },
  wetBasisWater: { name: "water content on wet mass", symbol: "w_wet", kind: "percent", from: 0, to: 95 },
  optimumWater: { name: "optimum water content", symbol: "w_opt", kind: "percent", from: 0, to: 2000 },
  targetWater: { name: "target water content", symbol: "w_target", kind: "percent", from: 0, to: 2000 },
  otherOptimum: { name: "optimum under the other effort", symbol: "w_opt,2", kind: "percent", from: 0, to: 2000 },
  liquidLimit: { name: "liquid limit", symbol: "LL", kind: "percent", from: 0, to: 1000, above: true },
  plasticLimit: { name: "plastic limit", symbol: "PL", kind: "percent", from: 0, to: 500, above: true },
  addedWaterShare: { name: "added water, percent of moist mass", symbol: "z", kind: "points", from: -50, to: 100 },
  peakAddedWater: { name: "added water at the peak, percent of moist mass", symbol: "z_m", kind: "points", from: -50, to: 100 },
  gaugeWaterPercent: { name: "water content by gauge", symbol: "w_gauge", kind: "percent", from: 0, to: 300 },
  gaugeOffset: { name: "offset of the gauge", symbol: "Δ", kind: "points", from: -1000, to: 1000, leftOut: 0 },
  firstWater: { name: "first water content", symbol: "w_1", kind: "percent", from: 0, to: 2000 },
  secondWater: { name: "second water content", symbol: "w_2", kind: "percent", from: 0, to: 2000 },
  blendShare: { name: "share of the second soil", symbol: "s", kind: "percent", ...orZero },
  finesShare: { name: "share of fines", symbol: "f", kind: "percent", from: 0, to: 100 },
  efficiency: { name: "efficiency", symbol: "η", kind: "percent", from: 0, to: 100, above: true, leftOut: 100 },
  waterGap: { name: "distance from optimum", symbol: "Δw", kind: "points", from: -Infinity, to: Infinity },
  saturation: { name: "degree of saturation", symbol: "S", kind: "percent", from: 0, to: 100, above: true },
  airVoids: { name: "air voids", symbol: "A", kind: "percent", from: 0, to: 99 },
  porosity: { name: "porosity", symbol: "n", kind: "percent", from: 0, to: 100 },
  relativeCompaction: { name: "relative compaction", symbol: "RC", kind: "percent", from: 0, to: 200 },
  relativeDensity: { name: "relative density", symbol: "D_r", kind: "percent", from: -100, to: 200 },
  waterRatio: { name: "water content over optimum", symbol: "w/w_opt", kind: "percent", ...orZero },
  fineWater: { name: "water content of the fine fraction", symbol: "w_fine", kind: "percent", from: 0, to: 2000 },
  wholeWater: { name: "water content of the whole soil", symbol: "w_whole", kind: "percent", from: 0, to: 2000 },
  stonePercent: { name: "oversize", symbol: "P", kind: "percent", from: 0, to: 95 },
  stoneWater: { name: "water content of the oversize", symbol: "w_stone", kind: "percent", from: 0, to: 40, smallShare: true },
  swell: { name: "swell", symbol: "s", kind: "percent", from: -100, to: Infinity },
  shrink: { name: "shrink", symbol: "c", kind: "percent", from: -Infinity, to: 100 },
  bulking: { name: "bulking", symbol: "b", kind: "percent", from: -100, to: Infinity },
  loss: { name: "loss", symbol: "L", kind: "percent", from: 0, to: 95, leftOut: 0 },

  specificGravity: { name: "specific gravity of the solids", symbol: "G_s", kind: "ratio", from: 1, to: 6 },
  stoneGravity: { name: "bulk specific gravity of the oversize", symbol: "G_stone", kind: "ratio", from: 1, to: 6 },
  voidRatio: { name: "void ratio", symbol: "e", kind: "ratio", ...orZero },

  wetMass: { name: "mass of wet soil and tin", symbol: "m_wet", kind: "mass", ...positive },
  dryMass: { name: "mass of dry soil and tin", symbol: "m_dry", kind: "mass", ...positive },
  tare: { name: "mass of the tin", symbol: "m_tin", kind: "mass", ...orZero, leftOut: 0 },
  mouldAndSoil: { name: "mass of mould and wet soil", symbol: "m_gross", kind: "mass", ...positive },
  mouldMass: { name: "mass of the mould", symbol: "m_mould", kind: "mass", ...orZero },
  soilMass: { name: "mass of the soil from the hole", symbol: "m_soil", kind: "mass", ...positive },
  containerAndSand: { name: "mass of container and sand", symbol: "m_full", kind: "mass", ...positive },
  containerMass: { name: "mass of the empty container", symbol: "m_empty", kind: "mass", ...orZero },
  bottleBefore: { name: "mass of bottle and sand before", symbol: "m_1", kind: "mass", ...positive },
  bottleAfter: { name: "mass of bottle and sand after", symbol: "m_2", kind: "mass", ...orZero },
  firstMass: { name: "first moist mass", symbol: "m_1", kind: "mass", ...orZero },
  secondMass: { name: "second moist mass", symbol: "m_2", kind: "mass", ...orZero },
  sandUsed: { name: "mass of sand used", symbol: "m_sand", kind: "mass", ...positive },
  sandInCone: { name: "mass of sand in the cone", symbol: "m_cone", kind: "mass", ...orZero },
  moistMass: { name: "moist mass of the batch", symbol: "m", kind: "mass", ...positive },
  addedWater: { name: "water to add", symbol: "Δm", kind: "mass", from: -Infinity, to: Infinity },
  rammerMass: { name: "mass of the rammer", symbol: "m_r", kind: "mass", ...positive },
  mouldVolume: { name: "volume of the mould", symbol: "V", kind: "volume", ...positive },
  containerVolume: { name: "volume of the container", symbol: "V", kind: "volume", ...positive },
  holeVolume: { name: "volume of the hole", symbol: "V_hole", kind: "volume", ...positive },
  volume: { name: "volume", symbol: "V", kind: "volume", ...orZero },
  fillVolume: { name: "volume of the fill", symbol: "V_fill", kind: "volume", ...orZero },
  bankVolume: { name: "volume in the bank", symbol: "V_bank", kind: "volume", ...orZero },
  mouldDiameter: { name: "diameter of the mould", symbol: "D", kind: "length", ...positive },
  mouldHeight: { name: "height of the mould", symbol: "H", kind: "length", ...positive },
  thickness: { name: "thickness of the compacted lift", symbol: "t", kind: "length", ...positive },
  evaporation: { name: "evaporation a day", symbol: "E", kind: "length", ...positive },
  drumWidth: { name: "width of the drum", symbol: "B", kind: "length", ...positive },
  rollerSpeed: { name: "speed of the roller", symbol: "v", kind: "speed", ...positive },
  rollerPasses: { name: "passes", symbol: "N", kind: "count", ...positive },
  rollRate: { name: "compacted volume an hour", symbol: "Q", kind: "volume", ...orZero },
  dryingDays: { name: "days of drying", symbol: "T", kind: "count", ...orZero },
  sprayRate: { name: "water on the lift", symbol: "q", kind: "water", from: -Infinity, to: Infinity },
  tenPercentSize: { name: "size that 10 % pass", symbol: "D_10", kind: "length", ...positive },
  thirtyPercentSize: { name: "size that 30 % pass", symbol: "D_30", kind: "length", ...positive },
  sixtyPercentSize: { name: "size that 60 % pass", symbol: "D_60", kind: "length", ...positive },
  uniformity: { name: "uniformity coefficient", symbol: "C_u", kind: "ratio", ...positive },
  curvature: { name: "curvature coefficient", symbol: "C_c", kind: "ratio", ...positive },
  coarseGravity: { name: "specific gravity of the coarse soil", symbol: "G_coarse", kind: "ratio", from: 1, to: 6 },
  looseThickness: { name: "loose thickness", symbol: "t_loose", kind: "length", ...positive },
  drop: { name: "drop of the rammer", symbol: "h", kind: "length", ...positive },
  blows: { name: "blows per layer", symbol: "N_b", kind: "count", ...positive },
  layers: { name: "layers", symbol: "N_l", kind: "count", ...positive },
  otherEffort: { name: "the other compactive effort", symbol: "E_2", kind: "energy", ...positive },
  compactiveEffort: { name: "compactive effort", symbol: "E", kind: "energy", ...orZero },
  waterNeed: { name: "water needed", symbol: "W", kind: "water", from: -Infinity, to: Infinity },
  waterToSpray: { name: "water to spray", symbol: "W_spray", kind: "water", ...orZero },
  temperature: { name: "temperature", symbol: "t", kind: "temperature", from: 0, to: 40 },
} as const satisfies Record<string, Quantity>;

export type QuantityId = keyof typeof quantities;

/** The same table with the literal types forgotten, for code that serves any quantity. */
export const quantity = (id: QuantityId): Quantity => quantities[id];
