import { FunctionError, type FunctionMetadata, type FunctionsMetadata, type Runtime } from "./custom-functions";
import type { Library } from "./library";
import { messageKey, type Messages } from "./messages";

/* eslint-disable @typescript-eslint/no-explicit-any -- the engine's value objects are untyped at this seam */

/**
 * Our functions as the engine wants them: a class each, from functions.json and what the bundle registered.
 * Classes are used rather than the engine's own registration because that turns the text "12" into a number and "1/2" into a date.
 */
export function engineFunctions(library: Library, metadata: FunctionsMetadata, namespace: string, { registry }: Runtime, messages: Messages) {
  const host = valueBridge(library);

  const executor = (declared: FunctionMetadata) => class extends (library.BaseFunction as any) {
    isArgumentsIgnoreNumberPattern(): boolean { return true; }

    calculate(...given: any[]): any {
      const run = registry.get(declared.id.toUpperCase());
      const args = declared.parameters.map((parameter, i) => given[i] === undefined ? null : parameter.dimensionality === "matrix" ? host.matrix(given[i]) : host.matrix(given[i])[0]?.[0] ?? null);
      const note = (error: FunctionError, row: number, column: number): void => {
        if (error.message) messages.set(messageKey(this.subUnitId as string, this.row as number + row, this.column as number + column), error.message);
      };
      try {
        if (!run) throw new FunctionError("#NAME?", `${namespace}.${declared.name} is not in the functions bundle.`);
        const result = run(...args);
        if (Array.isArray(result)) result.forEach((line: unknown[], r) => line.forEach((cell, c) => { if (cell instanceof FunctionError) note(cell, r, c); }));
        return host.toEngine(result);
      } catch (error) {
        const shown = error instanceof FunctionError ? error : new FunctionError("#VALUE!", `${namespace}.${declared.name} failed: ${error instanceof Error ? error.message : String(error)}`);
        note(shown, 0, 0);
        return host.toEngine(shown);
      }
    }
  };

  return {
    function: metadata.functions.map((declared) => [executor(declared), `${namespace}.${declared.name}`] as [any, string]),
    description: metadata.functions.map((declared) => ({
      functionName: `${namespace}.${declared.name}`,
      functionType: library.FunctionType.User,
      description: declared.description,
      abstract: declared.description,
      functionParameter: declared.parameters.map((parameter) => ({
        name: parameter.name, detail: parameter.description ?? parameter.name, example: "", require: parameter.optional ? 0 : 1, repeat: parameter.repeating ? 1 : 0,
      })),
    })) as any[],
  };
}

function valueBridge(library: Library) {
  const fromEngine = (value: any): unknown =>
    value === null || value === undefined || value.isNull() ? null : value.isError() ? new FunctionError(value.getErrorType()) : value.getValue();

  const cell = (value: unknown): any => {
    if (value instanceof FunctionError) return library.ErrorValueObject.create(value.code as any);
    if (value === null || value === undefined) return library.NullValueObject.create();
    if (typeof value === "number") return Number.isFinite(value) ? library.NumberValueObject.create(value) : library.ErrorValueObject.create("#NUM!" as any);
    if (typeof value === "boolean") return library.BooleanValueObject.create(value);
    return library.StringValueObject.create(String(value));
  };

  return {
    /** a range, an array or a lone value as rows of plain values */
    matrix(value: any): unknown[][] {
      if (value.isReferenceObject?.()) value = value.toArrayValueObject();
      if (!value.isArray()) return [[fromEngine(value)]];
      const rows: unknown[][] = Array.from({ length: value.getRowCount() }, () => new Array<unknown>(value.getColumnCount()).fill(null));
      value.iterator((one: any, row: number, column: number) => { rows[row]![column] = fromEngine(one); });
      return rows;
    },
    toEngine(value: unknown): any {
      if (!Array.isArray(value)) return cell(value);
      const rows = value as unknown[][];
      if (rows.length === 1 && rows[0]!.length === 1) return cell(rows[0]![0]);
      return library.ArrayValueObject.create({
        calculateValueList: rows.map((row) => row.map(cell)), rowCount: rows.length, columnCount: rows[0]?.length ?? 0, unitId: "", sheetId: "", row: -1, column: -1,
      });
    },
  };
}
