import { v7 } from "uuid";

/** A new id: UUIDv7, so that ids sort by the time they were made. */
export const newId = (): string => v7();
