import type * as NodePreset from "@univerjs/preset-sheets-node-core";
import type { FUniver } from "@univerjs/core/facade";

/**
 * The parts of the spreadsheet engine (Univer 0.25.1) that this room uses, handed in by the caller, because the browser's build
 * and Node's are different modules. The engine is before its 1.0: nothing outside this room and the bench names it.
 */
export type Library = Pick<typeof NodePreset, "BaseFunction" | "ArrayValueObject" | "BooleanValueObject" | "ErrorValueObject" | "NullValueObject" | "NumberValueObject" | "StringValueObject" | "FunctionType" | "FormulaDataModel" | "ISuperTableService">;

export type Api = ReturnType<typeof FUniver.newAPI>;
export type EngineWorkbook = NonNullable<ReturnType<Api["getActiveWorkbook"]>>;
export type EngineSheet = NonNullable<ReturnType<EngineWorkbook["getSheetByName"]>>;

/** The engine's injector, which gives what its public face does not: what a spill has filled. */
export interface Injector { get(token: unknown): unknown }
