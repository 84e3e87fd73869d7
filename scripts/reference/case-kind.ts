/** A value as it stands in a case file. */
export type Json = string | number | boolean | null | Json[] | { [key: string]: Json };
export type JsonObject = { [key: string]: Json };

/** One compared value. */
export interface Finding {
  what: string;
  expected: string;
  actual: string;
  /** Expected less actual, or empty where no number is compared. */
  difference: string;
  ok: boolean;
}

/**
 * Answers a case with the product's own core and compares. It throws what the core throws for bad input.
 * @param expected empty for a case that must be refused
 */
export type CaseKind = (input: JsonObject, expected: JsonObject) => Finding[];

export interface ReferenceCase {
  id: string;
  kind: string;
  input: JsonObject;
  expected?: JsonObject;
  /** The input must be refused with a clear message. */
  error?: boolean;
  citation?: string;
  certainty?: string;
}

/** Reads an object. @throws {Error} naming what is missing */
export function asObject(value: Json | undefined, what: string): JsonObject {
  if (value !== null && typeof value === 'object' && !Array.isArray(value)) return value;
  throw new Error(`${what} must be an object.`);
}

/** Reads a list. @throws {Error} naming what is missing */
export function asList(value: Json | undefined, what: string): Json[] {
  if (Array.isArray(value)) return value;
  throw new Error(`${what} must be a list.`);
}

/** Reads a text or a number as text. @throws {Error} naming what is missing */
export function asText(value: Json | undefined, what: string): string {
  if (typeof value === 'string') return value;
  if (typeof value === 'number') return String(value);
  throw new Error(`${what} must be a text.`);
}
