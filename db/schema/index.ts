/** Drizzle wants every table in one module; this is the only barrel. */
export * from "./assessments";
export * from "./events";
export * from "./firms";
export * from "./jobs";
export * from "./operator-entries";
export * from "./operator-settings";
export * from "./outbox";
export * from "./packs";
export * from "./people";
export * from "./photos";
export * from "./reviews";
export * from "./submissions";
