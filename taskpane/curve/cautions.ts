/** The usual cautions of a compaction curve. Common practice, no published source. */
export const cautions = {
  line: "Holds only for this soil, prepared as it was tested. Not a substitute for local codes, the project specification or a licensed engineer's judgement.",
  full: [
    "Soil that was reused or air-dried before compaction can shift the optimum for good; residual and volcanic clays do so most.",
    "Clay needs the water mixed in and a night to soak before it is compacted.",
    "The sample must represent the fill. One curve never fits a borrow that changes.",
    "Rock that breaks down under the rammer gives another soil than the one that was sampled.",
    "The interval describes the scatter of the points about the curve. It knows nothing of a wrong specific gravity, a mould out of calibration, or a sample that is not the fill.",
    "A point past the zero-air-voids line is a question about a reading, not evidence of intent.",
    "Local codes, the project specification and a licensed engineer's judgement come first.",
  ],
} as const;
