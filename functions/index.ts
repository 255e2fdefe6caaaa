/** Everything the functions bundle holds: one module a family. */
export * from "./mass-and-volume";
export * from "./compaction";
export * from "./beyond-one-curve";
export * from "./field";
export * from "./lots";
export * from "./earthwork";
