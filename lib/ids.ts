import { v7 } from "uuid";

/** A new id: UUIDv7, so that ids sort by the time they were made. */
export const newId = (): string => v7();

const ID = /^[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;

/** Whether a text has the form of an id. What has not is not looked up: the keys are ASCII and would choke on other letters. */
export const isId = (text: string): boolean => ID.test(text);
