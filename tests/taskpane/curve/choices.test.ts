import { noChoices, readChoices, writeChoices, type Choices } from "../../../taskpane/curve/choices";

test("choices come back as they were written", () => {
  const choices: Choices = { corrections: { orientation: "across", roles: { 1: "wetDensity" }, units: { 1: "kg/m3" } }, curve: "cubic", specificGravity: "2.68", assumed: true, waterDensity: "1", soil: "fine", pointScatter: "0.4", wetScatter: "", waterScatter: "0,5", weigh: true, stonePercent: "10", stoneGravity: "2.73", stoneWater: "", reportedDry: "1.85", reportedWater: "14", standard: "BS 1377-4", test: "A" };
  expect(readChoices(writeChoices(choices))).toEqual(choices);
});

test.each([null, "", "not json", "[]", "3", "null"])("%p is no choice", (text) => expect(readChoices(text)).toEqual(noChoices));

test("what a stranger's workbook holds is not trusted", () => {
  expect(readChoices(JSON.stringify({
    corrections: { orientation: "sideways", roles: { 1: "king", x: "tare", 2: "tare" }, units: { 1: 7, 2: "x".repeat(200) } },
    curve: "septic", specificGravity: 2.7, assumed: "yes", waterDensity: {},
  }))).toEqual({ ...noChoices, corrections: { roles: { 2: "tare" }, units: {} } });
});
