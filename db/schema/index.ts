export * from "./people";
export * from "./catalogue";
export * from "./books";
export * from "./pickups";
export * from "./bins";
export * from "./prices";
export * from "./tickets";
export * from "./money";
