/**
 * The example workbook's contents: an invented job, with no real place, firm or person behind it.
 * Readings are typed; everything that can be computed is a live formula.
 */
export type Style = "title" | "note" | "heading" | "unit" | "text" | "input" | "whole" | "tenth" | "hundredth" | "thousandth";

export type Entry =
  | null
  | { readonly value: string | number; readonly style: Style }
  | { readonly formula: string; readonly style: Style }
  /** a cell that only has a format: a spill fills it */
  | { readonly style: Style };

export interface ExampleSheet {
  readonly name: string;
  /** in characters */
  readonly widths: readonly number[];
  readonly rows: readonly (readonly Entry[])[];
  /** rows that stay in sight */
  readonly frozenRows: number;
}

const text = (value: string, style: Style = "text"): Entry => ({ value, style });
const number = (value: number, style: Style = "input"): Entry => ({ value, style });
const formula = (body: string, style: Style = "hundredth"): Entry => ({ formula: body, style });
/** formats for the cells that a formula above will fill */
const filled = (...styles: Style[]): Entry[] => styles.map((style) => ({ style }));
const headings = (...words: string[]): Entry[] => words.map((word) => word === "" ? null : text(word, "heading"));
const units = (...words: string[]): Entry[] => words.map((word) => word === "" ? null : text(word, "unit"));

/** A1's rows made as wide as asked, so that a block can be placed at a column. */
function place(rows: Entry[][], atRow: number, atColumn: number, block: readonly (readonly Entry[])[]): void {
  block.forEach((line, r) => line.forEach((entry, c) => {
    const row = rows[atRow + r] ??= [];
    while (row.length <= atColumn + c) row.push(null);
    row[atColumn + c] = entry;
  }));
}

function sheet(name: string, widths: number[], frozenRows: number, ...blocks: [row: number, column: number, block: readonly (readonly Entry[])[]][]): ExampleSheet {
  const rows: Entry[][] = [];
  for (const [row, column, block] of blocks) place(rows, row, column, block);
  for (let r = 0; r < rows.length; r++) rows[r] ??= [];
  return { name, widths, rows, frozenRows };
}

const start = sheet("Start here", [4, 100], 0, [0, 0, [
  [text("Tampsheet example workbook", "title")],
  [text("Hollow Lane embankment: an invented job. No real place, firm or person; every reading is made up.", "note")],
  [],
  [number(1, "whole"), text("Lab A: a laboratory test in SI units, points down the rows. Select A6:K12, headings and all, and look at the pane.")],
  [number(2, "whole"), text("Lab B: a test in US units, points across the columns. Select A4:F8.")],
  [number(3, "whole"), text("Lab C: a test with a reading past the zero-air-voids line. Select A4:C10 and enter 2.68 as the specific gravity.")],
  [number(4, "whole"), text("Borrow: three tests below one another, a family of curves, the one-point and the rapid method. Select A3:C18.")],
  [number(5, "whole"), text("Field: field tests against those references, and water and borrow for the next lift.")],
  [number(6, "whole"), text("Reference: the remaining functions, one row each, for trying out.")],
  [],
  [null, text("Change a reading (yellow) and every figure that rests on it follows. A compaction curve holds for the soil tested, as it was tested.", "note")],
  [null, text("These figures do not replace the project specification, the local code, or the judgement of a licensed engineer.", "note")],
]]);

/** mould and wet soil, tin numbers, and the three weighings of each tin, in grams */
const LAB_A = [
  [6116, 14, 58.31, 54.54, 17.62], [6222, 7, 61.72, 56.78, 16.59], [6290, 22, 63.20, 57.48, 17.05], [6281, 3, 66.94, 59.99, 16.88], [6231, 31, 64.41, 57.05, 17.20],
] as const;

const labA = sheet("Lab A", [7, 16, 9, 13, 8, 10, 10, 9, 14, 12, 12, 3, 29, 20, 14, 14], 7,
  [0, 0, [
    [text("Lab A: lean clay, light compaction (2.5 kg rammer)", "title")],
    [text("Invented data. Points run down the rows; water from tins, density from a one-litre mould.", "note")],
    [text("Specific gravity of the solids", "text"), null, null, number(2.7, "hundredth"), text("measured", "note")],
  ]],
  [5, 0, [
    headings("Point", "Mould + wet soil", "Mould", "Mould volume", "Tin no", "Wet + tin", "Dry + tin", "Tin", "Water content", "Wet density", "Dry density"),
    units("", "g", "g", "cm³", "", "g", "g", "g", "%", "Mg/m³", "Mg/m³"),
    ...LAB_A.map(([gross, tin, wet, dry, tare], i): Entry[] => [
      number(i + 1, "whole"), number(gross, "input"), number(4196, "input"), number(1000, "input"), number(tin, "whole"), number(wet, "input"), number(dry, "input"), number(tare, "input"),
      ...(i === 0
        ? [formula("TAMP.WATERPCT(F8:F12,G8:G12,H8:H12)", "tenth"), formula("TAMP.MOULDWET(B8:B12,C8:C12,D8:D12)", "thousandth"), formula("TAMP.SOILDRY(J8:J12,I8:I12)", "thousandth")]
        : filled("tenth", "thousandth", "thousandth")),
    ]),
  ]],
  [5, 12, [
    headings("Peak of the curve", "", "", ""),
    [formula('TAMP.PEAKFIT(I8:I12,K8:K12,"auto",D3,"Mg/m3")', "heading"), ...filled("heading", "heading", "heading")],
    filled("text", "thousandth", "thousandth", "thousandth"),
    filled("text", "tenth", "tenth", "tenth"),
    [],
    filled("text", "thousandth"),
    [],
    filled("text", "tenth"),
    filled("text", "tenth"),
  ]],
  [15, 0, [
    headings("Point", "Saturation", "Air voids"),
    units("", "%", "%"),
    ...LAB_A.map((_, i): Entry[] => [
      number(i + 1, "whole"),
      ...(i === 0 ? [formula("TAMP.SATPCT(K8:K12,I8:I12,D3)", "tenth"), formula("TAMP.AIRPCT(K8:K12,I8:I12,D3)", "tenth")] : filled("tenth", "tenth")),
    ]),
  ]],
);

const WATER_B = [7.1, 9.0, 11.2, 13.1, 15.0], WET_B = [124.2, 130.1, 134.9, 134.2, 131.3];
const labB = sheet("Lab B", [33, 12, 12, 12, 12, 12, 3, 30, 14, 13, 13], 0,
  [0, 0, [
    [text("Lab B: silty sand, standard effort", "title")],
    [text("Invented data in US units. Points run across the columns.", "note")],
    [],
    [text("Point", "unit"), ...[1, 2, 3, 4, 5].map((n) => number(n, "whole"))],
    [text("Water content (%)"), ...WATER_B.map((w) => number(w))],
    [text("Wet unit weight (lb/ft³)"), ...WET_B.map((d) => number(d))],
    [text("Dry unit weight (lb/ft³)"), formula("TAMP.SOILDRY(B6:F6,B5:F5)", "tenth"), ...filled("tenth", "tenth", "tenth", "tenth")],
    [text("Zero air voids (lb/ft³)"), formula('TAMP.VOIDFREE(B5:F5,B10,"lb/ft3")', "tenth"), ...filled("tenth", "tenth", "tenth", "tenth")],
    [],
    [text("Specific gravity, assumed"), number(2.67, "hundredth")],
    [],
    [text("Maximum dry unit weight (lb/ft³)"), formula('TAMP.PEAKDRY(B5:F5,B7:F7,"auto",B10,"lb/ft3")', "tenth")],
    [text("Optimum water content (%)"), formula('TAMP.PEAKWATER(B5:F5,B7:F7,"auto",B10,"lb/ft3")', "tenth")],
    [],
    [text("Water content on the curve (%)"), ...[8, 10, 12, 14].map((w) => number(w, "tenth"))],
    [text("Dry unit weight (lb/ft³)"), formula('TAMP.CURVEDRY(B15:E15,B5:F5,B7:F7,"auto",B10,"lb/ft3")', "tenth"), ...filled("tenth", "tenth", "tenth")],
  ]],
);

const LAB_C = [[12.0, 16.6], [14.1, 17.24], [16.0, 17.6], [18.2, 17.52], [20.1, 17.34]] as const;
const labC = sheet("Lab C", [16, 15, 16, 14, 12, 3, 13, 14, 110], 5,
  [0, 0, [
    [text("Lab C: clay, light compaction, as a contractor reported it", "title")],
    [text("Invented data. One of these points cannot be right at the specific gravity stated: find it.", "note")],
    [text("Specific gravity"), number(2.68, "hundredth")],
    headings("Point", "Water content", "Dry unit weight", "Past the line", "Least Gs"),
    units("", "%", "kN/m³", "", ""),
    ...LAB_C.map(([w, dry], i): Entry[] => [
      number(i + 1, "whole"), number(w), number(dry),
      ...(i === 0 ? [formula('TAMP.PASTZAV(C6:C10,B6:B10,B3,"kN/m3")', "text"), formula('TAMP.LEASTGS(C6:C10,B6:B10,"kN/m3")', "hundredth")] : filled("text", "hundredth")),
    ]),
  ]],
  [3, 6, [
    headings("What to look at", "", ""),
    [formula('TAMP.CURVEFLAGS(B6:B10,C6:C10,"auto",B3,"kN/m3")', "text")],
  ]],
);

const BORROW = [
  ["pit 1", [[13.6, 1.621], [15.4, 1.676], [17.5, 1.702], [19.6, 1.673], [21.4, 1.602]]],
  ["pit 2", [[10.9, 1.717], [13.1, 1.781], [15.0, 1.803], [17.2, 1.772], [18.9, 1.707]]],
  ["pit 3", [[8.3, 1.823], [10.5, 1.887], [12.4, 1.911], [14.3, 1.886], [16.5, 1.808]]],
] as const;
const RAPID = [[-2, 1.955], [0, 2.043], [2, 2.091]] as const;
const borrow = sheet("Borrow", [10, 15, 14, 3, 54, 20, 26, 12, 20, 12, 12, 14, 9, 60], 3,
  [0, 0, [
    [text("Borrow: three soils of one kind, light compaction", "title")],
    [text("Invented data. The name of a test stands beside its first point; all of them are fitted at once.", "note")],
    headings("Test", "Water content (%)", "Dry density (Mg/m³)"),
    ...BORROW.flatMap(([name, points]) => points.map(([water, dry], i): Entry[] => [i === 0 ? text(name) : null, number(water), number(dry)])),
  ]],
  [2, 4, [
    [formula('TAMP.PEAKTABLE(A4:A18,B4:B18,C4:C18,"auto",2.7)', "heading"), ...filled("heading", "heading", "heading", "heading", "heading", "heading", "heading", "heading", "heading")],
    ...BORROW.map(() => filled("text", "thousandth", "thousandth", "thousandth", "tenth", "tenth", "tenth", "text", "whole", "text")),
  ]],
  [7, 4, [
    headings("One point compacted in the field: which peak does it belong to?", "", ""),
    [text("Water content, %"), number(14.6)], [text("Dry density, Mg/m³"), number(1.735)],
    [formula("TAMP.FAMILYPICK(F9,F10,A4:C18)", "text"), ...filled("thousandth", "text")],
    filled("text", "tenth"),
  ]],
  [16, 4, [
    headings("Rapid method: fill of 2.000 Mg/m³ wet, at 14 % as dried later", "", ""),
    [formula("TAMP.RAPIDPEAK(A23:A25,B23:B25,2,14)", "text"), ...filled("tenth", "text")],
    filled("text", "tenth"), filled("text", "hundredth"), filled("text", "thousandth"), filled("text", "hundredth"),
  ]],
  [20, 0, [
    headings("Water added", "Wet density"), units("% of moist", "Mg/m³"),
    ...RAPID.map(([added, wet]): Entry[] => [number(added), number(wet)]),
  ]],
  [24, 4, [
    headings("Plausibility", "", ""),
    [text("97 % of pit 2 holds between these water contents, %"), formula('TAMP.WATERSPAN(B9:B13,C9:C13,97)', "tenth"), ...filled("tenth")],
    [text("Shape of pit 2"), formula("TAMP.CURVEKIND(B9:B13,C9:C13,38)", "text")],
    [formula("TAMP.EFFORTPEAK(F5,I5,595,2700,38)", "text"), ...filled("thousandth", "text")],
    filled("text", "tenth", "text"),
    [formula("TAMP.PLASTICPEAK(19)", "text"), ...filled("text", "text", "text")],
    filled("text", "thousandth", "tenth", "text"), filled("text", "thousandth", "tenth", "text"),
  ]],
);

const FIELD = [
  ["F1", "0+020", 2.047, 14.6], ["F2", "0+040", 2.012, 13.1], ["F3", "0+060", 2.061, 15.2], ["F4", "0+080", 1.969, 12.4],
  ["F5", "0+100", 2.033, 16.8], ["F6", "0+120", 2.054, 14.1],
] as const;
const field = sheet("Field", [12, 14, 16, 14, 14, 20, 14, 12, 12, 52], 6,
  [0, 0, [
    [text("Field tests on the lean clay, against Lab A", "title")],
    [text("Invented data. Relative compaction and distance from optimum follow the fitted peak of Lab A.", "note")],
    [text("Maximum dry density"), null, formula("TAMP.PEAKDRY('Lab A'!I8:I12,'Lab A'!K8:K12,\"auto\",'Lab A'!D3)", "thousandth"), text("Mg/m³", "unit")],
    [text("Optimum water content"), null, formula("TAMP.PEAKWATER('Lab A'!I8:I12,'Lab A'!K8:K12,\"auto\",'Lab A'!D3)", "tenth"), text("%", "unit")],
    headings("Test", "Station", "Wet density", "Water content", "Dry density", "Relative compaction", "From optimum", "Saturation", "Air voids", "Verdict"),
    units("", "", "Mg/m³", "%", "Mg/m³", "%", "points", "%", "%", ""),
    ...FIELD.map(([id, station, wet, w], i): Entry[] => [
      text(id), text(station), number(wet, "input"), number(w, "input"),
      ...(i === 0 ? [
        formula("TAMP.SOILDRY(C7:C12,D7:D12)", "thousandth"), formula("TAMP.RELCOMP(E7:E12,C3)", "tenth"), formula("TAMP.WATERGAP(D7:D12,C4)", "tenth"),
        formula("TAMP.SATPCT(E7:E12,D7:D12,'Lab A'!D3)", "tenth"), formula("TAMP.AIRPCT(E7:E12,D7:D12,'Lab A'!D3)", "tenth"),
        formula("TAMP.FILLVERDICT(E7:E12,D7:D12,C3,C4,J4,'Lab A'!D3)", "text"),
      ] : filled("thousandth", "tenth", "tenth", "tenth", "tenth", "text")),
    ]),
  ]],
  [3, 8, [[text("Zone", "unit"), text("RC >= 95; gap -2..+2; air <= 10")]]],
  [14, 0, [
    [text("Water and borrow for the next lift", "title")],
    [text("Volume of compacted fill, m³"), null, null, number(1200, "input")],
    [text("Dry density of the fill, Mg/m³"), null, null, formula("0.97*C3", "thousandth")],
    [text("Dry density in the borrow, Mg/m³"), null, null, number(1.62, "input")],
    [text("Water content in the borrow, %"), null, null, number(11.5, "input")],
    [text("Water lost in spraying, %"), null, null, number(10, "input")],
    [text("Borrow to dig, m³ in the bank, 3 % wasted"), null, null, formula("TAMP.BANKVOL(D16,D17,D18,3)", "whole")],
    [text("Water to spray, litres"), null, null, formula("TAMP.WATERADD(D16,D17,D19,C4,D20)", "whole")],
  ]],
);

/** One row a function: what it answers, the formula, the unit. */
const REFERENCE: readonly (readonly [string, string, Style, string])[] = [
  ["Carbide reading of 12 % on wet mass, as water content on dry mass", "TAMP.DRYBASIS(12)", "hundredth", "%"],
  ["Wet density of 1.80 Mg/m³ dry at 14.5 %", "TAMP.SOILWET(1.8,14.5)", "thousandth", "Mg/m³"],
  ["5 % air-voids line at 16 %, Gs 2.70", "TAMP.AIRLINE(16,2.7,5)", "thousandth", "Mg/m³"],
  ["80 % saturation line at 16 %, Gs 2.70", "TAMP.SATLINE(16,2.7,80)", "thousandth", "Mg/m³"],
  ["Water that fills every void at 115 lb/ft³, Gs 2.67", 'TAMP.FULLWATER(115,2.67,"lb/ft3")', "tenth", "%"],
  ["Void ratio at 18.1 kN/m³, Gs 2.70", 'TAMP.VOIDRATIO(18.1,2.7,"kN/m3")', "thousandth", ""],
  ["Porosity at 18.1 kN/m³, Gs 2.70", 'TAMP.POREPCT(18.1,2.7,"kN/m3")', "tenth", "%"],
  ["Water at 15 °C", 'TAMP.WATERDENS(15,"kg/m3")', "tenth", "kg/m³"],
  ["1.83 Mg/m³ as a unit weight", 'TAMP.DENSITYAS(1.83,"Mg/m3","lb/ft3")', "tenth", "lb/ft³"],
  ["Effort of 27 blows a layer, 3 layers, 2.5 kg, 300 mm, 1 litre", "TAMP.BLOWWORK(2.5,300,27,3,1000)", "tenth", "kJ/m³"],
  ["Drive cylinder: 2147 g with 218 g of tube, 1021 cm³", "TAMP.MOULDWET(2147,218,1021)", "thousandth", "Mg/m³"],
  ["Mould of 101.6 mm diameter, 116.4 mm high", "TAMP.MOULDVOL(101.6,116.4)/1000", "tenth", "cm³"],
  ["Water for a batch of 2500 g from 6 to 11 %", "TAMP.MIXWATER(2500,6,11)", "tenth", "g"],
  ["Whole soil from 1.97 Mg/m³ fine, 10 % oversize of 2.73", "TAMP.WHOLEDRY(1.97,10,2.73)", "thousandth", "Mg/m³"],
  ["Whole soil's optimum from 12 % fine, 10 % oversize at 1.5 %", "TAMP.WHOLEWATER(12,10,1.5)", "hundredth", "%"],
  ["Fine fraction of 2.03 Mg/m³ whole, 10 % oversize of 2.73", "TAMP.FINEDRY(2.03,10,2.73)", "thousandth", "Mg/m³"],
  ["Fine fraction's water from 10.9 % whole, 10 % oversize at 1.5 %", "TAMP.FINEWATER(10.9,10,1.5)", "hundredth", "%"],
  ["12.4 % in percent of an optimum of 14 %", "TAMP.WATERRATIO(12.4,14)", "tenth", "%"],
  ["Relative density of 1.62 between 1.45 and 1.72 Mg/m³", "TAMP.RELDENSITY(1.62,1.45,1.72)", "tenth", "%"],
  ["Sand cone: 3.62 kg of soil, 4.10 kg of sand, 1.52 kg in the cone, 1.41 Mg/m³", "TAMP.SANDCONE(3.62,4.1,1.52,1.41)", "thousandth", "Mg/m³"],
  ["Balloon: 3.62 kg of soil from 1.83 L", "TAMP.HOLEWET(3.62,1.83)", "thousandth", "Mg/m³"],
  ["Swell from 1.80 in the bank to 1.42 Mg/m³ loose", "TAMP.SWELLPCT(1.8,1.42)", "tenth", "% of bank"],
  ["Shrink from 1.62 in the bank to 1.78 Mg/m³ in the fill", "TAMP.SHRINKPCT(1.62,1.78)", "tenth", "% of bank"],
  ["Loose thickness for a lift of 200 mm", "TAMP.LOOSELIFT(200,1.78,1.4)", "whole", "mm"],
  ["Bulking of sand: 1.28 moist, 1.55 Mg/m³ dry and loose", "TAMP.SANDBULK(1.28,1.55)", "tenth", "%"],
  ["Density of the sand: container of 4.00 L, 5.64 kg full, 0 kg tared", "TAMP.SANDDENS(5.64,0,4)", "thousandth", "Mg/m³"],
  ["Sand in the cone: 7.53 kg before, 6.01 kg after", "TAMP.CONESAND(7.53,6.01)", "hundredth", "kg"],
  ["Gauge: 128.4 lb/ft³ wet, 12.1 lb/ft³ of water, offset 0.6", "TAMP.GAUGEDRY(128.4,12.1,0.6)", "tenth", "lb/ft³"],
  ["Offset of that gauge where the oven says 11.0 %", "TAMP.GAUGEOFFSET(128.4,12.1,11)", "hundredth", "lb/ft³"],
  ["Chance that 1.83 meets 95 % of 1.90, with 0.02 and 0.015 of uncertainty", "TAMP.PASSCHANCE(1.83,1.9,95,0.02,0.015)", "hundredth", ""],
  ["Percent of five tests' lot above 95", "TAMP.LOTWITHIN({96.2;97.4;95.1;98;96.8},95)", "tenth", "%"],
  ["Characteristic value of the same lot", "TAMP.LOTCHAR({96.2;97.4;95.1;98;96.8})", "tenth", "%"],
  ["Tests for 6200 m³, one for each 1500, three at least", "TAMP.LOTTESTS(6200,1500,3)", "whole", ""],
  ["Water on a lift of 200 mm at 1.80 Mg/m³, two points, 10 % lost", "TAMP.WATERSPRAY(200,1.8,10,12,10)", "tenth", "L/m²"],
  ["Days to dry the same lift by two points at 4 mm a day", "TAMP.DRYTIME(200,1.8,12,10,4)", "tenth", "days"],
  ["Blend of 100 t at 10 % and 50 t at 25 %", "TAMP.BLENDWATER(100,10,50,25)", "tenth", "%"],
  ["Share of the wetter soil for 14 %", "TAMP.BLENDSHARE(10,25,14)", "tenth", "% of moist mass"],
  ["Roller of 2 m, 4 km/h, lift of 200 mm, 6 passes, 50-minute hour", "TAMP.ROLLRATE(2,4,200,6,83.3)", "whole", "m³/h"],
  ["Water content from 250 g wet, 220 g dry, tin 50 g", "TAMP.WATERPCT(250,220,50)", "hundredth", "%"],
];
const TRIAL = [[1, 1.772], [2, 1.823], [4, 1.886], [6, 1.911], [8, 1.927], [10, 1.931]] as const;
const reference = sheet("Reference", [76, 14, 10, 3, 42, 26, 26, 14], 3,
  [2, 4, [
    headings("Roller trial: passes, dry density", ""),
    ...TRIAL.map(([passes, dry]): Entry[] => [number(passes, "whole"), number(dry)]),
    [],
    [formula("TAMP.ROLLFIT(E4:E9,F4:F9,1.9)", "text"), ...filled("text", "text", "text")],
    filled("text", "thousandth", "thousandth", "thousandth"), filled("text", "tenth", "text"), filled("text", "whole", "text"), filled("text", "thousandth", "text"),
    [],
    headings("Where to test a lot of 120 m by 8 m, seed 7", "", ""),
    [formula("TAMP.LOTSPOTS(120,8,5,7)", "text"), ...filled("text", "text")],
    ...[1, 2, 3, 4, 5].map(() => filled("whole", "tenth", "tenth")),
    [],
    headings("Fines that fill a coarse soil: share %, density", "", ""),
    [text("1.60 Mg/m³ coarse of 2.65, fines at 1.30"), formula("TAMP.FINESFILL(1.6,2.65,1.3)", "tenth"), ...filled("thousandth")],
    headings("Grading: uniformity, curvature, verdict", "", "", ""),
    [text("0.15, 0.9 and 2.4 mm, sand"), formula('TAMP.GRADEWELL(0.15,0.9,2.4,"sand")', "tenth"), ...filled("hundredth", "text")],
  ]],
  [0, 0, [
    [text("One of each", "title")],
    [text("Change the numbers inside the formulas to try a function out.", "note")],
    headings("Question", "Answer", "Unit"),
    ...REFERENCE.map(([question, body, style, unit]): Entry[] => [text(question), formula(body, style), text(unit, "unit")]),
  ]],
);

export const exampleSheets: readonly ExampleSheet[] = [start, labA, labB, labC, borrow, field, reference];
